import { describe, expect, it } from "vitest";
import { isBackupOld, presentBytes } from "./installation.ts";

describe("presentBytes", () => {
  it.each([
    [0, "0 bytes"],
    [999, "999 bytes"],
    [1000, "1 KB"],
    [640_000, "640 KB"],
    [12_400_000, "12.4 MB"],
    [3_000_000_000, "3 GB"],
  ])("says %i as %s", (bytes, words) => {
    expect(presentBytes(bytes)).toBe(words);
  });
});

describe("isBackupOld", () => {
  const now = Date.parse("2026-12-02T12:00:00Z");
  it("warns after a day, and when there is none", () => {
    expect(isBackupOld(now - 86_400_000, now)).toBe(false);
    expect(isBackupOld(now - 86_400_001, now)).toBe(true);
    expect(isBackupOld(null, now)).toBe(true);
  });
});
