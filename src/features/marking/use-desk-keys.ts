import { useEffect, useEffectEvent, useSyncExternalStore } from "react";
import { type DeskAction, parseDeskKey } from "./model/desk-keys.ts";

const STORAGE_KEY = "duskbell:marking-keys";
const listeners = new Set<() => void>();

function areKeysOn(): boolean {
  return window.localStorage.getItem(STORAGE_KEY) !== "off";
}

function subscribe(listener: () => void): () => void {
  listeners.add(listener);
  return () => listeners.delete(listener);
}

/** Turns the single keys on or off, for people whose speech input or hands press keys by chance; remembered on this device. */
export function setKeysOn(isOn: boolean): void {
  window.localStorage.setItem(STORAGE_KEY, isOn ? "on" : "off");
  for (const listener of listeners) listener();
}

export function useAreKeysOn(): boolean {
  return useSyncExternalStore(subscribe, areKeysOn);
}

/** Listens to the desk's keys while the page is open. */
export function useDeskKeys(onAction: (action: DeskAction) => void): void {
  const handleAction = useEffectEvent(onAction);
  useEffect(() => {
    const handleKey = (event: KeyboardEvent) => {
      if (event.defaultPrevented || event.repeat) return;
      const action = parseDeskKey(event);
      // "?" always answers: it is how the keys are turned on again.
      if (!action || (!areKeysOn() && action.kind !== "keys")) return;
      event.preventDefault();
      handleAction(action);
    };
    document.addEventListener("keydown", handleKey);
    return () => document.removeEventListener("keydown", handleKey);
  }, []);
}
