import type { NoticeTone } from "./notice.tsx";

export interface ToastMessage {
  tone?: NoticeTone;
  /** What happened, one sentence. */
  title: string;
  detail?: string;
  /** One act, "Undo" above all. A toast with an act stays until it is closed. */
  action?: { label: string; onPress: () => void };
}

export interface QueuedToast extends ToastMessage {
  id: number;
  /** Null: stays until it is closed. */
  leavesAfterMs: number | null;
}

const READING_MS = 8_000;
const MAX_TOASTS = 3;

let toasts: readonly QueuedToast[] = [];
let lastId = 0;
const listeners = new Set<() => void>();

function replaceToasts(next: readonly QueuedToast[]) {
  toasts = next;
  listeners.forEach((listener) => listener());
}

/** Shows passing news at the edge of the page and says it politely. A toast that warns, stops or offers an act stays until closed. Returns its id. */
export function showToast(message: ToastMessage): number {
  lastId += 1;
  const stays = message.action !== undefined || message.tone === "stop" || message.tone === "warn";
  replaceToasts([...toasts, { ...message, id: lastId, leavesAfterMs: stays ? null : READING_MS }].slice(-MAX_TOASTS));
  return lastId;
}

/** Takes a toast away; nothing happens when it is gone already. */
export function dismissToast(id: number) {
  replaceToasts(toasts.filter((toast) => toast.id !== id));
}

/** The toasts on screen, oldest first; the same array until something changes. */
export function listToasts(): readonly QueuedToast[] {
  return toasts;
}

/** Calls back when the list changes. Returns the way to stop. */
export function subscribeToToasts(listener: () => void): () => void {
  listeners.add(listener);
  return () => listeners.delete(listener);
}
