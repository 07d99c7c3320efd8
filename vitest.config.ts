import { defineConfig } from "vitest/config";

/**
 * One project a side of the arrows, so that a sandbox test cannot lean on a DOM and a client test has
 * one. `tests` holds what crosses sides on the server; `journeys` drives Chromium against the built
 * product and runs its files one after the other.
 */
export default defineConfig({
  test: {
    maxWorkers: 2,
    // Pages walked side by side; more would only wait for the two cores.
    maxConcurrency: 3,
    testTimeout: 30_000,
    hookTimeout: 120_000,
    projects: [
      { extends: true, test: { name: "sandbox", include: ["sandbox/**/*.test.ts"], environment: "node" } },
      {
        extends: true,
        test: { name: "shared", include: ["shared/**/*.test.ts", "lessons/**/*.test.ts"], environment: "node" },
      },
      { extends: true, test: { name: "server", include: ["server/**/*.test.ts"], environment: "node" } },
      {
        extends: true,
        test: {
          name: "src",
          include: ["src/**/*.test.{ts,tsx}"],
          environment: "jsdom",
          setupFiles: ["tests/support/dom-setup.ts"],
          // Stylesheets are emptied in tests; the contrast test reads the tokens.
          css: { include: [/tokens\.css/] },
        },
      },
      { extends: true, test: { name: "tests", include: ["tests/**/*.test.ts"], environment: "node" } },
      {
        extends: true,
        test: {
          name: "journeys",
          include: ["tests/journeys/**/*.spec.ts"],
          globalSetup: ["tests/journeys/support/global-setup.ts"],
          environment: "node",
          fileParallelism: false,
          testTimeout: 300_000,
          hookTimeout: 240_000,
        },
      },
    ],
  },
});
