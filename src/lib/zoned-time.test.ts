import { describe, expect, it } from "vitest";
import { addDays, countDays, presentDate, presentDue, presentLength, presentWhen, toLocalDate } from "./zoned-time.ts";

const ZONE = "America/New_York";
const at = (text: string) => Date.parse(text);

describe("toLocalDate", () => {
  it("takes the date of the zone, not of UTC", () => {
    expect(toLocalDate(at("2026-12-05T03:30:00Z"), ZONE)).toBe("2026-12-04");
  });
});

describe("presentWhen", () => {
  const now = at("2026-12-02T14:00:00Z");
  it("says today and yesterday by the zone's midnight", () => {
    expect(presentWhen(at("2026-12-02T13:55:00Z"), now, ZONE)).toBe("today 08:55");
    expect(presentWhen(at("2026-12-02T04:59:00Z"), now, ZONE)).toBe("yesterday 23:59");
    expect(presentWhen(at("2026-12-03T14:00:00Z"), now, ZONE)).toBe("tomorrow 09:00");
  });
  it("names the weekday within a week and the date before that", () => {
    expect(presentWhen(at("2026-11-30T15:00:00Z"), now, ZONE)).toBe("Mon 10:00");
    expect(presentWhen(at("2026-11-12T15:00:00Z"), now, ZONE)).toBe("12 Nov 10:00");
  });
});

describe("presentDue", () => {
  it("writes the weekday, the date and the time of the zone", () => {
    expect(presentDue(at("2026-12-04T20:30:00Z"), ZONE)).toBe("Fri 4 December, 15:30");
  });
});

describe("local dates", () => {
  it("counts and adds over a month's end and a change of the clocks", () => {
    expect(countDays("2026-10-31", "2026-11-02")).toBe(2);
    expect(addDays("2026-10-31", 2)).toBe("2026-11-02");
    expect(addDays("2026-03-01", -1)).toBe("2026-02-28");
  });
  it("is written as column, full and day", () => {
    expect(presentDate("2026-12-09", "column")).toBe("Wed 9");
    expect(presentDate("2026-12-09", "full")).toBe("Wednesday 9 December");
    expect(presentDate("2026-12-09", "day")).toBe("9 December");
  });
});

describe("presentLength", () => {
  it("rounds to whole seconds and carries the minute", () => {
    expect(presentLength(144)).toBe("2:24");
    expect(presentLength(59.6)).toBe("1:00");
  });
});
