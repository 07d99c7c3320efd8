import { describe, expect, it } from "vitest";
import type { ProgrammeShow } from "../../../../shared/contracts/lineup.ts";
import { findOnNow, searchShows } from "./on-now.ts";

const show = (fields: Partial<ProgrammeShow>): ProgrammeShow => ({
  slotId: "slot-1",
  date: "2026-12-11",
  startsAt: "18:20",
  title: "Nine Foxes",
  publicName: "Wren and Idris, Tarn Road",
  schoolName: "Tarn Road Middle School",
  songTitle: "Quillhaven Bells",
  seconds: 144,
  description: "",
  ribbon: null,
  ...fields,
});

describe("findOnNow", () => {
  const at = (iso: string) => findOnNow([show({})], Date.parse(iso), "America/New_York");

  it("runs from its start to its end by the event's clock", () => {
    // New York keeps UTC-5 in December.
    expect(at("2026-12-11T23:19:59Z")).toBeNull();
    expect(at("2026-12-11T23:20:00Z")).toBe("slot-1");
    expect(at("2026-12-11T23:22:59Z")).toBe("slot-1");
    expect(at("2026-12-11T23:23:00Z")).toBeNull();
  });
});

describe("searchShows", () => {
  it("finds by every word, anywhere, in any case", () => {
    expect(searchShows([show({})], "foxes TARN")).toHaveLength(1);
    expect(searchShows([show({})], "foxes quill lantern")).toHaveLength(0);
  });

  it("finds nothing for no words", () => {
    expect(searchShows([show({})], "  ")).toHaveLength(0);
  });
});
