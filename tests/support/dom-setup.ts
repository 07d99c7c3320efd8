import { cleanup } from "@testing-library/react";
import { afterEach } from "vitest";

// Vitest runs without globals here, so the library cannot register its own clean-up.
afterEach(cleanup);

// jsdom 26 has no CSS.escape, which the component library calls with plain names (W3C CSSOM, "serialize an identifier").
globalThis.CSS ??= { escape: (name: string) => name.replace(/[^\w-]/g, String.raw`\$&`) } as typeof CSS;
