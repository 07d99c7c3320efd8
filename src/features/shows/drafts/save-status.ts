import { hasUnsavedText, type DraftState } from "./draft-model.ts";

/** What the save state says, always as text. `tone` only picks an icon and a colour. */
export interface SaveStatus {
  readonly label: "Saved" | "Saving" | "Kept on this computer" | "Only in this tab" | "Two versions";
  readonly detail: string;
  readonly tone: "calm" | "busy" | "careful";
}

/** The save state in words, for the moment `now` (milliseconds since 1970). */
export function presentSaveStatus(state: DraftState, now: number): SaveStatus {
  if (state.sync.kind === "two-versions")
    return {
      label: "Two versions",
      detail: "This show was changed somewhere else too. Both texts are kept. Choose one.",
      tone: "careful",
    };
  if (!hasUnsavedText(state)) return { label: "Saved", detail: presentAge(state.savedAt, now), tone: "calm" };
  if (state.sync.kind === "sending" && state.sync.attempt === 0)
    return { label: "Saving", detail: "On its way to the school's server.", tone: "busy" };
  if (state.sync.kind === "resting" && !state.isKeepingBroken)
    return { label: "Saving", detail: "On its way to the school's server.", tone: "busy" };
  if (state.isKeepingBroken)
    return {
      label: "Only in this tab",
      detail: "This browser can not keep the text. Do not close the tab until it is saved.",
      tone: "careful",
    };
  return { label: "Kept on this computer", detail: presentReason(state), tone: "careful" };
}

function presentReason(state: DraftState): string {
  if (state.sync.kind === "signed-out") return "You are signed out. Sign in again to save it.";
  if (state.sync.kind === "refused") return state.sync.reason;
  return "The server does not answer. I keep trying.";
}

function presentAge(savedAt: number | null, now: number): string {
  if (savedAt === null) return "";
  const seconds = Math.max(0, Math.round((now - savedAt) / 1000));
  if (seconds < 5) return "just now";
  if (seconds < 60) return `${Math.floor(seconds / 5) * 5} seconds ago`;
  const minutes = Math.floor(seconds / 60);
  if (minutes < 60) return minutes === 1 ? "1 minute ago" : `${minutes} minutes ago`;
  const hours = Math.floor(minutes / 60);
  if (hours < 24) return hours === 1 ? "1 hour ago" : `${hours} hours ago`;
  const days = Math.floor(hours / 24);
  return days === 1 ? "yesterday" : `${days} days ago`;
}
