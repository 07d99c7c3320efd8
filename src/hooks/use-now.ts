import { useSyncExternalStore } from "react";

const STEP_MS = 30_000;

const toStep = () => Math.floor(Date.now() / STEP_MS) * STEP_MS;

function subscribe(listener: () => void): () => void {
  const timer = window.setInterval(listener, STEP_MS);
  return () => window.clearInterval(timer);
}

/** Now in UTC milliseconds, to the half minute; renders again when that changes. For "today 08:55" and the like. */
export function useNow(): number {
  return useSyncExternalStore(subscribe, toStep);
}
