import { describe, expect, it } from "vitest";
import { clockOfNight, daysBetween, sayDate, secondsOfNight, tonightIn } from "./night-time.ts";

describe("tonightIn", () => {
  const zone = "America/New_York";

  it("rolls over at 04:00 local time", () => {
    // Eastern standard time is UTC-5 (IANA tz database).
    expect(tonightIn(zone, Date.UTC(2026, 11, 5, 8, 59, 59))).toBe("2026-12-04");
    expect(tonightIn(zone, Date.UTC(2026, 11, 5, 9, 0, 0))).toBe("2026-12-05");
  });

  it("goes by the local clock on the night that summer time ends", () => {
    // On 2026-11-01 clocks in New York go back at 02:00 (first Sunday of November, US law): 04:00 is 09:00 UTC.
    expect(tonightIn(zone, Date.UTC(2026, 10, 1, 8, 59))).toBe("2026-10-31");
    expect(tonightIn(zone, Date.UTC(2026, 10, 1, 9, 0))).toBe("2026-11-01");
  });
});

describe("times of a night", () => {
  it("counts hours after midnight on", () => {
    expect(secondsOfNight("18:20")).toBe(66_000);
    expect(secondsOfNight("00:30")).toBe(88_200);
    expect(clockOfNight(secondsOfNight("23:59") + 61)).toBe("00:01");
  });

  it("says dates in words", () => {
    expect(sayDate("2026-12-04")).toBe("Fri 4 Dec");
    expect(daysBetween("2026-12-31", "2027-01-02")).toBe(2);
  });
});
