import type { HashHost } from "../../sandbox/engine/finish.ts";

/** What a browser lends for reading results: its cryptography. */
export const hashHost: HashHost = {
  sha256: async (bytes) => {
    const digest = await crypto.subtle.digest("SHA-256", bytes.slice());
    return Array.from(new Uint8Array(digest), (byte) => byte.toString(16).padStart(2, "0")).join("");
  },
  encodeText: (text) => new TextEncoder().encode(text),
};
