import { ipKeyGenerator } from "express-rate-limit";
import type { Clock } from "../clock.ts";

const WINDOW_MS = 10 * 60 * 1000;
/** A class of 32 that all mistype twice makes 64; a school day's first minutes behind one address some 200. */
const FAILURES_A_WINDOW = 300;
const ADDRESSES_LIMIT = 20_000;
/** One household or school gets a /64 of IPv6: its addresses count together. */
const IPV6_PREFIX_BITS = 64;

/** Failed sign-ins by address, kept in memory: a restart forgetting them does no harm. */
export interface AddressFailures {
  add(address: string): void;
  isOverLimit(address: string): boolean;
}

/** Counts failures in fixed windows of ten minutes. Successes never count. */
export function createAddressFailures(clock: Clock): AddressFailures {
  const windows = new Map<string, { startedAt: number; count: number }>();
  const find = (address: string) => {
    const found = windows.get(toKey(address));
    return found && clock.now() - found.startedAt < WINDOW_MS ? found : null;
  };
  return {
    add(address) {
      const found = find(address);
      if (found) found.count++;
      else {
        if (windows.size >= ADDRESSES_LIMIT) dropOver(windows, clock.now());
        windows.set(toKey(address), { startedAt: clock.now(), count: 1 });
      }
    },
    isOverLimit: (address) => (find(address)?.count ?? 0) >= FAILURES_A_WINDOW,
  };
}

function toKey(address: string): string {
  return ipKeyGenerator(address, IPV6_PREFIX_BITS);
}

function dropOver(windows: Map<string, { startedAt: number; count: number }>, now: number): void {
  for (const [key, window] of windows) if (now - window.startedAt >= WINDOW_MS) windows.delete(key);
  // Still full: somebody owns that many addresses. Start over rather than grow.
  if (windows.size >= ADDRESSES_LIMIT) windows.clear();
}
