import { afterEach, beforeEach, describe, expect, it, vi } from "vitest";
import earlyScript from "../public/theme.js?raw";
import { getShownTheme, getThemeChoice, subscribeToTheme, THEME_STORAGE_KEY, updateThemeChoice } from "./theme.ts";

const root = document.documentElement;
let systemIsDark = false;

beforeEach(() => {
  systemIsDark = false;
  localStorage.clear();
  delete root.dataset.theme;
  // jsdom has no matchMedia.
  vi.stubGlobal("matchMedia", () => ({
    matches: systemIsDark,
    addEventListener: () => undefined,
    removeEventListener: () => undefined,
  }));
});
afterEach(() => vi.unstubAllGlobals());

/** Runs the script that the page runs before its first paint. */
function runEarlyScript() {
  // eslint-disable-next-line @typescript-eslint/no-implied-eval -- the page runs this very text, outside any module
  new Function(earlyScript)();
}

describe("theme", () => {
  it("follows the system until somebody chooses", () => {
    expect(getThemeChoice()).toBe("system");
    expect(getShownTheme()).toBe("light");
    systemIsDark = true;
    expect(getShownTheme()).toBe("dark");
  });

  it("pins and remembers a choice, and forgets it again", () => {
    updateThemeChoice("dark");
    expect(root.dataset.theme).toBe("dark");
    expect(localStorage.getItem(THEME_STORAGE_KEY)).toBe("dark");
    updateThemeChoice("system");
    expect(root.dataset.theme).toBeUndefined();
    expect(localStorage.getItem(THEME_STORAGE_KEY)).toBeNull();
  });

  it("is pinned before the first paint from what was remembered", () => {
    updateThemeChoice("dark");
    delete root.dataset.theme;
    runEarlyScript();
    expect(getThemeChoice()).toBe("dark");
  });

  it("ignores a remembered value it does not know", () => {
    localStorage.setItem(THEME_STORAGE_KEY, "sepia");
    runEarlyScript();
    expect(getThemeChoice()).toBe("system");
  });

  it("tells listeners, also of a choice in another tab, until they stop", () => {
    const listener = vi.fn();
    const stop = subscribeToTheme(listener);
    updateThemeChoice("dark");
    window.dispatchEvent(new StorageEvent("storage", { key: THEME_STORAGE_KEY, newValue: "light" }));
    expect(listener).toHaveBeenCalledTimes(2);
    expect(getShownTheme()).toBe("light");
    stop();
    updateThemeChoice("dark");
    expect(listener).toHaveBeenCalledTimes(2);
  });
});
