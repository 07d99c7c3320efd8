import type { ForwardSummary, Lineup, Night, Slot } from "../../../../shared/contracts/lineup.ts";

/** A forwarded show of the demo world for tests; `overrides` names what the test is about. */
export function buildForward(id: string, overrides: Partial<ForwardSummary> = {}): ForwardSummary {
  return {
    id: id,
    submissionId: `${id}-sub`,
    versionId: `${id}-ver`,
    title: id,
    authors: ["Ada"],
    publicName: "Ada, Tarn Road",
    schoolName: "Tarn Road Middle School",
    className: "7B",
    songId: "song-bells",
    songTitle: "Quillhaven Bells",
    seconds: 128,
    state: "approved",
    note: "",
    answer: null,
    teacherName: "Ms Marlow",
    forwardedAt: Date.parse("2026-12-01T15:00:00Z"),
    stopCount: 0,
    warnCount: 0,
    slotCount: 0,
    ribbon: null,
    ...overrides,
  };
}

export function buildNight(date: string, overrides: Partial<Night> = {}): Night {
  return { id: `night-${date.slice(-2)}`, date, opensAt: "17:00", closesAt: "18:00", closedReason: null, ...overrides };
}

/** A slot written as "07 17:20 foxes": day of December, start time, show. */
export function buildSlot(text: string, isPinned = false): Slot {
  const [day, startsAt, show] = text.split(" ");
  return {
    id: `slot-${day}-${startsAt?.replace(":", "")}`,
    nightId: `night-${day}`,
    startsAt: startsAt ?? "",
    forwardId: show as Slot["forwardId"],
    isPinned,
  };
}

/** A week of the demo season, Monday 7 to Sunday 13 December, with the Sunday closed and three start times. */
export function buildLineup(overrides: Partial<Lineup> = {}): Lineup {
  const dates = ["07", "08", "09", "10", "11", "12", "13"].map((day) => `2026-12-${day}`);
  return {
    season: {
      name: "Quillhaven Winter Lights",
      firstDate: "2026-12-03",
      lastDate: "2026-12-30",
      timeZone: "America/New_York",
    },
    times: ["17:00", "17:20", "17:40"],
    nights: dates.map((date) => buildNight(date, date.endsWith("13") ? { closedReason: "Market day" } : {})),
    slots: [],
    shows: [
      buildForward("foxes", { title: "Nine Foxes", authors: ["Wren", "Idris"], seconds: 144 }),
      buildForward("snow", { title: "Slow Snow", schoolName: "Quillhaven Intermediate", seconds: 160 }),
    ],
    findings: [],
    publication: null,
    changeCount: 0,
    tonight: "2026-12-07",
    ...overrides,
  };
}
