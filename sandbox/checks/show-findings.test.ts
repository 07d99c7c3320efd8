import { describe, expect, it } from "vitest";
import {
  buildFront,
  buildLayout,
  buildShow,
  buildSong,
  fadeTo,
  off,
  on,
  pulse,
  type OutletSketch,
} from "../../tests/factories/small-show.ts";
import type { Finding } from "../engine/model.ts";
import type { WrittenCue } from "../timeline/build.ts";
import { createCheckContext } from "./context.ts";
import { findFit } from "./fit.ts";
import { checkShow, hasStop, mergeFindings } from "./index.ts";
import { continuousLimitWatts, energyKilowattHours, neededBreakerAmps, relayWearShare } from "./load-rules.ts";
import { findInrush } from "./inrush.ts";
import { findLoads, listCircuitLoads } from "./load.ts";
import { DEFAULT_RULES, tightenRules } from "./rules.ts";
import { SEVERITIES } from "./severities.ts";
import { countStreetFlashes } from "./street-flash.ts";
import { countRelayCycles, findHalfCycle, findRelayDwell, findRelayRate, findRelayWear } from "./switching.ts";

const rulesOf = (findings: readonly Finding[]) => findings.map(({ rule }) => rule);

describe("electrical sums (NEC 210.20(A), as restated in trade publications)", () => {
  it("lets lights take 1440 W of 15 A and 1920 W of 20 A at 120 V", () => {
    expect(continuousLimitWatts(120, 15)).toBeCloseTo(1440, 9);
    expect(continuousLimitWatts(120, 20)).toBeCloseTo(1920, 9);
  });
  it("meets a published table of lamps a circuit (15 A, 20 A)", () => {
    // A lamp seller's table of 0.6, 1, 2.5 and 3.7 W lamps; it rounds to the nearest lamp.
    for (const [watts, on15, on20] of [
      [0.6, 2400, 3200],
      [1, 1440, 1920],
      [2.5, 576, 768],
      [3.7, 389, 519],
    ] as const)
      expect([15, 20].map((amps) => Math.round(continuousLimitWatts(120, amps) / watts))).toEqual([on15, on20]);
  });
  it("counts whole lamps of 5 and 7 W (computed): 288 and 205 on 15 A, 384 and 274 on 20 A", () => {
    for (const [watts, on15, on20] of [
      [5, 288, 384],
      [7, 205, 274],
    ] as const)
      expect([15, 20].map((amps) => Math.floor(continuousLimitWatts(120, amps) / watts + 1e-9))).toEqual([on15, on20]);
  });
  it("adds 125 % of the continuous load to the rest: 6 A and 5 A fit 15 A, 11 A and 2 A do not", () => {
    expect(neededBreakerAmps(6, 5)).toBe(12.5);
    expect(neededBreakerAmps(11, 2)).toBe(15.75);
  });
  it("counts energy: 1440 W for 2 h on 30 nights are 86.4 kWh", () => {
    expect(energyKilowattHours(1440, 2 * 30)).toBeCloseTo(86.4, 9);
  });
  it("counts wear against the 100 000 switchings of relay datasheets: 90 a show are 16 % in a season, 360 are 65 %", () => {
    const season = { plays: 6 * 30, lifeCycles: 100_000 };
    expect(relayWearShare({ cyclesPerShow: 90, ...season })).toBeCloseTo(0.162, 3);
    expect(relayWearShare({ cyclesPerShow: 360, ...season })).toBeCloseTo(0.648, 3);
  });
});

describe("load", () => {
  const dimmers = (...watts: number[]) =>
    buildFront(...watts.map((value): OutletSketch => ({ kind: "dimmer", watts: value })));
  const check = (layout: ReturnType<typeof dimmers>, cues: readonly WrittenCue[]) =>
    createCheckContext({ timeline: buildShow(layout, cues), layout, song: buildSong() });

  it("stops four boxes of 400 W at once on 15 A: 1600 W is below the breaker and above 80 % of it", () => {
    const layout = dimmers(400, 400, 400, 400);
    const [finding] = findLoads(check(layout, [on(4, [0, 1, 2, 3], 100, 6), off(8, [0, 1, 2, 3])]));
    expect(finding).toMatchObject({
      rule: "circuit-overload",
      severity: "stop",
      measured: { value: 13.3, limit: 12, unit: "A" },
      moments: [4 * 960],
      lines: [6],
    });
    expect(finding?.sentence).toBe('The circuit "a" takes 13.3 A in bar 2. It may take 12 A.');
    expect(finding?.hint).toContain("a licensed electrician decide");
  });
  it("fits 200 lamps of 7 W on 15 A and not 206", () => {
    expect(findLoads(check(dimmers(200 * 7), [on(0, 0)]))).toEqual([]);
    expect(rulesOf(findLoads(check(dimmers(206 * 7), [on(0, 0)])))).toEqual(["circuit-overload"]);
  });
  it("lets exactly 1440 W pass", () => {
    expect(findLoads(check(dimmers(1000, 440), [on(0, [0, 1])]))).toEqual([]);
  });
  it("warns when only everything at once would be too much", () => {
    const found = findLoads(check(dimmers(400, 400, 400, 400), [on(0, [0, 1, 2]), on(8, 3, 50)]));
    expect(found.map(({ rule, severity }) => [rule, severity])).toEqual([["circuit-everything-on", "warn"]]);
  });
  it("takes the worst moment, with levels as shares and pulses on top", () => {
    const layout = dimmers(600, 600);
    const [load] = listCircuitLoads(check(layout, [on(0, 0, 50), fadeTo(4, 1, 100, 4), off(9, 1), pulse(8.5, 0, 1)]));
    // At 8.5 the second is full and the first pulses: 1200 W. Before: 300 + 600.
    expect(load?.peakAmps).toBeCloseTo(10, 6);
    expect(load?.peakTick).toBe(8.5 * 960);
    expect(load?.fullAmps).toBeCloseTo(10, 6);
  });
  it("notes many cold lamps that come on at once: filaments take about 12 times their current", () => {
    const all = [0, 1, 2, 3];
    const inrush = (cues: readonly WrittenCue[]) => findInrush(check(dimmers(200, 200, 200, 200), cues));
    // 800 W are 6.7 A; 12 times that is more than five times 15 A.
    expect(inrush([on(4, all, 100, 6)])).toMatchObject([
      {
        rule: "circuit-inrush",
        severity: "note",
        measured: { value: 80, limit: 75, unit: "A" },
        moments: [4 * 960],
        lines: [6],
      },
    ]);
    expect(inrush([on(4, all, 90)])).toEqual([]);
    expect(inrush(all.map((light) => on(4 + light / 4, light)))).toEqual([]);
    expect(inrush([fadeTo(4, all, 100, 4)])).toEqual([]);
    // Lamps that glow already are not cold.
    expect(inrush([fadeTo(0, all, 20, 4), on(8, all)])).toEqual([]);
  });
  it("keeps circuits apart", () => {
    const layout = buildFront({ kind: "dimmer", watts: 1400 }, { kind: "dimmer", watts: 1900, circuit: "b" });
    const loads = listCircuitLoads(check(layout, [on(0, [0, 1])]));
    expect(
      loads.map(({ circuit, limitAmps, peakAmps }) => [circuit.id, limitAmps, Math.round(peakAmps * 100) / 100]),
    ).toEqual([
      ["a", 12, 11.67],
      ["b", 16, 15.83],
    ]);
  });
  it("takes the mains of the layout: 2990 W of a 13 A plug at 230 V are 13 A", () => {
    const layout = {
      ...buildFront({ kind: "dimmer", watts: 2990 }),
      circuits: [{ id: "a", volts: 230, breakerAmps: 13 }],
    };
    expect(listCircuitLoads(check(layout, [on(0, 0)]))[0]?.peakAmps).toBeCloseTo(13, 9);
  });
});

describe("switching", () => {
  const layout = buildFront("relay", "solid-state", "dimmer");
  const check = (
    cues: readonly WrittenCue[],
    { tempo = 120, hertz = 60 }: { readonly tempo?: number; readonly hertz?: 50 | 60 } = {},
  ) => {
    const square = { ...layout, mains: { volts: 120, hertz } };
    return createCheckContext({ timeline: buildShow(square, cues), layout: square, song: buildSong({}, { tempo }) });
  };

  it("warns of a relay that is on or off for less than 500 ms (common practice)", () => {
    const [finding, ...more] = findRelayDwell(
      check([pulse(0, [0, 1], 0.5, undefined, 3), pulse(4, 0, 1, undefined, 4)]),
    );
    expect(finding).toMatchObject({
      rule: "relay-dwell",
      severity: "warn",
      measured: { value: 250, limit: 500, unit: "ms" },
      lights: ["front-a/roof"],
      lines: [3],
    });
    expect(more).toEqual([]);
    expect(findRelayDwell(check([on(0, 0), off(4, 0), on(4.5, 0), off(8, 0)]))[0]?.measured?.value).toBe(250);
  });
  it("lets whole beats pass at 120 a minute and not at 140", () => {
    const cues = [pulse(0, 0, 1), pulse(2, 0, 1), pulse(4, 0, 1)];
    expect(findRelayDwell(check(cues))).toEqual([]);
    expect(findRelayDwell(check(cues, { tempo: 140 }))[0]?.measured?.value).toBe(429);
  });
  it("gives the same script no such finding on a solid-state box", () => {
    expect(findRelayDwell(check([pulse(0, 1, 0.5)]))).toEqual([]);
    expect(findHalfCycle(check([pulse(0, 1, 0.5)]))).toEqual([]);
  });
  it("notes times below half a cycle of the mains on a solid-state box: 8.3 ms at 60 Hz, 10 ms at 50 Hz", () => {
    // 0.018 beats at 120 a minute are 8.85 ms with ticks rounded (17 ticks).
    const cues = [pulse(0, 1, 0.018, undefined, 2)];
    expect(findHalfCycle(check(cues))).toEqual([]);
    expect(findHalfCycle(check(cues, { hertz: 50 }))[0]).toMatchObject({
      rule: "half-cycle",
      severity: "note",
      measured: { value: 8.9, limit: 10, unit: "ms" },
      lines: [2],
    });
  });
  it("warns of a relay that comes on more often than once in two seconds for half a minute (1800 an hour, relay datasheets)", () => {
    const every = (step: number) =>
      Array.from({ length: Math.floor(32 / step) }, (_, turn) => [
        on(turn * step, 0, 100, 2),
        off((turn + 0.5) * step, 0),
      ]).flat();
    // At 60 beats a minute 32 beats are 32 seconds.
    expect(findRelayRate(check(every(2), { tempo: 60 }))).toEqual([]);
    const [finding] = findRelayRate(check(every(1), { tempo: 60 }));
    expect(finding).toMatchObject({
      rule: "relay-rate",
      measured: { value: 30, limit: 15 },
      lights: ["front-a/roof"],
      lines: [2],
    });
  });
  it("warns of a relay that a season of the show would wear out by more than half (100 000 switchings, relay datasheets)", () => {
    const long = buildFront("relay", "dimmer");
    const find = (turns: number) => {
      const cues = Array.from({ length: turns }, (_, turn) => pulse(turn, [0, 1], 0.5, undefined, 5));
      const timeline = buildShow(long, cues, { endTick: 400 * 960 });
      return findRelayWear(createCheckContext({ timeline, layout: long, song: buildSong({}, { bars: 100 }) }));
    };
    // Half of 100 000 in 180 plays: 277 times a show.
    expect(find(277)).toEqual([]);
    expect(find(360)).toMatchObject([
      {
        rule: "relay-wear",
        severity: "warn",
        measured: { value: 65, limit: 50, unit: "% of its life" },
        lights: ["front-a/roof"],
        lines: [5],
      },
    ]);
  });
  it("takes two solid-state outlets that switch half a cycle apart for one (they wait for the mains, up to 10 ms)", () => {
    const two = buildLayout([{ side: "north", outlets: ["solid-state", "solid-state"] }]);
    const blink = (later: number) =>
      Array.from({ length: 30 }, (_, beat) =>
        [0, 1].flatMap((light) => [on(beat + light * later, light), off(beat + light * later + 0.5, light)]),
      ).flat();
    const worst = (later: number) =>
      countStreetFlashes(
        createCheckContext({ timeline: buildShow(two, blink(later)), layout: two, song: buildSong() }),
      )[0]?.worst;
    // At 120 beats a minute 10 ms are 0.02 beats; a beat apart the two would be four flashes a second.
    expect(worst(0.02)).toBe(2);
    expect(worst(0.25)).toBe(4);
  });
  it("counts how often each relay comes on", () => {
    expect([...countRelayCycles(check([pulse(0, [0, 1], 1), pulse(1, 0, 1), pulse(4, 0, 1)]))]).toEqual([[0, 2]]);
  });
});

describe("fit", () => {
  const layout = buildLayout([
    { side: "north", outlets: ["dimmer"] },
    { side: "south", outlets: ["dimmer"] },
  ]);
  const fit = (cues: readonly WrittenCue[], overrides = {}, song = buildSong()) =>
    findFit(createCheckContext({ timeline: buildShow(layout, cues, overrides), layout, song }));

  it("is content with a show that fills its song", () => {
    expect(fit([on(0, [0, 1])])).toEqual([]);
  });
  it("stops a show that lights nothing, one that is not whole, and one for another length", () => {
    expect(rulesOf(fit([]))).toEqual(["nothing-lit"]);
    expect(rulesOf(fit([on(0, [0, 1])], { isComplete: false }))).toEqual(["incomplete"]);
    const [finding] = fit([on(0, [0, 1])], {}, buildSong({}, { bars: 9 }));
    expect(finding).toMatchObject({
      rule: "wrong-length",
      severity: "stop",
      sentence: "The show is made for 32 beats, but the song has 36.",
    });
  });
  it("notes a song that plays on over a dark square", () => {
    const [finding] = fit([on(0, [0, 1]), off(16, [0, 1])]);
    expect(finding).toMatchObject({
      rule: "ends-early",
      severity: "note",
      measured: { value: 50, limit: 90 },
      moments: [16 * 960],
    });
    expect(finding?.sentence).toBe("The square is dark after bar 4, but the song plays on.");
    expect(fit([on(0, [0, 1]), off(29, [0, 1])])).toEqual([]);
  });
  it("notes a long dark stretch, at the start too", () => {
    // At 60 beats a minute: 16 seconds of darkness.
    const slow = buildSong({}, { tempo: 60 });
    expect(fit([on(16, [0, 1])], {}, slow)[0]).toMatchObject({
      rule: "long-dark",
      measured: { value: 16, limit: 15, unit: "s" },
      moments: [0],
    });
    expect(fit([on(16, [0, 1])], {}, slow)[0]?.sentence).toBe("The square is dark for 16 seconds at the start.");
    expect(fit([on(0, [0, 1]), off(8, [0, 1]), on(24, [0, 1])], {}, slow)[0]?.sentence).toBe(
      "The square is dark for 16 seconds after bar 2.",
    );
    expect(fit([on(0, [0, 1]), off(8, [0, 1]), on(20, [0, 1])], {}, slow)).toEqual([]);
  });
  it("notes fronts that stay dark", () => {
    const [finding] = fit([on(0, 1)]);
    expect(finding).toMatchObject({
      rule: "dark-fronts",
      sentence: 'The front "front a" stays dark all the time.',
      lights: ["front-a/roof"],
    });
  });
});

describe("checkShow", () => {
  const layout = buildFront("relay", "dimmer", { kind: "colour" });
  it("puts stops first, then warnings, then notes", () => {
    const cues = Array.from({ length: 64 }, (_, turn) => pulse(turn / 2, [0, 1, 2], 0.5, undefined, 4)).concat(
      fadeTo(0, 1, 50, 8, 5),
      on(2, 1, 0, 6),
      on(3, 1, 20, 7),
      off(3, 1, 8),
    );
    const findings = checkShow({ timeline: buildShow(layout, cues), layout, song: buildSong() });
    expect(findings.map(({ severity, rule }) => `${severity} ${rule}`)).toEqual([
      "stop street-flash",
      "warn never-seen",
      "note fade-cut",
    ]);
    expect(hasStop(findings)).toBe(true);
  });
  it("takes stricter rules from the event", () => {
    const cues = Array.from({ length: 32 }, (_, turn) => pulse(turn, [0, 1, 2], 1));
    const input = { timeline: buildShow(layout, cues), layout, song: buildSong() };
    expect(hasStop(checkShow(input))).toBe(false);
    expect(rulesOf(checkShow({ ...input, rules: { flashesPerSecond: 1 } }))[0]).toBe("street-flash");
  });
  it("takes no looser rules for flashes and load from anybody", () => {
    const loose = {
      flashesPerSecond: 10,
      flashShare: 1,
      flashTogetherSeconds: 0,
      continuousShare: 1,
      longestDarkSeconds: 60,
    };
    expect(tightenRules(loose)).toEqual({ ...DEFAULT_RULES, longestDarkSeconds: 60 });
    expect(tightenRules({ flashesPerSecond: 2, relayDwellSeconds: 1 })).toEqual({
      ...DEFAULT_RULES,
      flashesPerSecond: 2,
      relayDwellSeconds: 1,
    });
  });
  it("refuses a timeline for another layout", () => {
    expect(() =>
      checkShow({ timeline: buildShow(layout, []), layout: buildFront("relay"), song: buildSong() }),
    ).toThrow(RangeError);
  });
  it("gives a reason for every severity", () => {
    for (const { reason } of Object.values(SEVERITIES)) expect(reason).toMatch(/^[A-Z].*\.$/);
  });
});

describe("mergeFindings", () => {
  const finding = (rule: string, severity: Finding["severity"], lines: number[]): Finding => ({
    rule,
    severity,
    sentence: rule,
    moments: lines,
    lights: [],
    lines,
  });
  it("sorts by severity and joins what is the same", () => {
    const merged = mergeFindings([
      [finding("a", "note", [3]), finding("b", "warn", [1])],
      [finding("a", "note", [2]), finding("c", "stop", [])],
    ]);
    expect(merged.map(({ rule, lines }) => [rule, ...lines])).toEqual([["c"], ["b", 1], ["a", 2, 3]]);
  });
});
