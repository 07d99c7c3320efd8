import { describe, expect, it } from "vitest";
import { CLOSES_AT, listNights, listSlots, START_TIMES } from "./season.ts";
import { demoScript } from "./scripts/index.ts";
import { demoSong } from "./songs/demo-songs.ts";
import { WORK } from "./work.ts";

const minutes = (time: string): number => Number(time.slice(0, 2)) * 60 + Number(time.slice(3));

describe.each(["2026-12-01", "2026-12-06", "2026-12-24", "2027-02-28", "2028-02-29"])(
  "the season round %s",
  (today) => {
    const nights = listNights(today);
    const slots = listSlots(today);

    it("has five weeks of nights, some dark, tonight open with shows", () => {
      expect(nights).toHaveLength(35);
      expect(nights[10]).toEqual({ date: today, closedReason: null });
      expect(nights.filter((night) => night.closedReason !== null).length).toBeGreaterThanOrEqual(5);
      expect(slots.filter((slot) => slot.date === today).length).toBeGreaterThanOrEqual(4);
    });

    it("is half filled: the nights at the end wait for shows", () => {
      expect(slots.some((slot) => slot.date > (nights[20]?.date ?? ""))).toBe(false);
    });

    it("plans only scheduled shows, on open nights, each of them on several", () => {
      const scheduled = WORK.filter((one) => one.forward?.state === "scheduled").map((one) => one.scriptId);
      expect(new Set(slots.map((slot) => slot.scriptId))).toEqual(new Set(scheduled));
      for (const slot of slots) expect(nights.find((night) => night.date === slot.date)?.closedReason).toBeNull();
    });

    it("lets every show end before the next one and before the quiet hour", () => {
      for (const slot of slots) {
        const { beats } = demoSong(demoScript(slot.scriptId).songId).beatMap;
        const end = minutes(slot.startsAt) + (beats.at(-1) ?? 0) / 60_000_000;
        const next = START_TIMES[START_TIMES.findIndex((time) => time === slot.startsAt) + 1] ?? CLOSES_AT;
        expect(end).toBeLessThan(minutes(next));
      }
    });

    it("shows nothing twice in one night, and the schools in turn", () => {
      for (const night of nights) {
        const ids = slots.filter((slot) => slot.date === night.date).map((slot) => slot.scriptId);
        expect(new Set(ids).size).toBe(ids.length);
        const classes = ids.map((id) => demoScript(id).authors[0]?.split("/")[0]);
        classes.slice(1).forEach((code, n) => expect(code).not.toBe(classes[n]));
      }
    });
  },
);
