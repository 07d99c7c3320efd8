import type { Circuit } from "../../shared/contracts/square.ts";
import type { Finding } from "../engine/model.ts";
import type { Light } from "../square/lights.ts";
import { createLightsCursor } from "../timeline/cursor.ts";
import { nameBar } from "../timeline/words.ts";
import { BIN_TICKS, countBins } from "./bins.ts";
import { createRecall } from "./check-memory.ts";
import type { CheckContext } from "./context.ts";
import { buildFinding, lineOfCue } from "./finding.ts";
import type { LightFacts } from "./light-facts.ts";
import { continuousLimitWatts } from "./load-rules.ts";

/** What a circuit carries in a show. */
export interface CircuitLoad {
  readonly circuit: Circuit;
  /** Amperes that may burn for hours. */
  readonly limitAmps: number;
  /** Most amperes at any moment of the show, and the tick where that is. */
  readonly peakAmps: number;
  readonly peakTick: number;
  /** Amperes with every light of the circuit fully on. */
  readonly fullAmps: number;
  /** Light indexes. */
  readonly lights: readonly number[];
}

/**
 * Gives the load of every circuit. A light at level 50 is counted with half its watts, in whatever
 * colour: more than lamps and strips take, so the sum errs on the safe side. Moments are 1/16 beat
 * wide and count the highest level in them.
 */
export function listCircuitLoads(context: CheckContext): readonly CircuitLoad[] {
  const { layout, lights, rules, timeline } = context;
  const facts = context.facts();
  return layout.circuits.map((circuit) => {
    const onIt = lights.filter((light) => light.circuit === circuit.id);
    const peak = recallPeak(
      context.memory,
      circuit.id,
      onIt.map(({ index }) => facts[index]),
      () => findPeak(facts, onIt, countBins(timeline.endTick)),
    );
    return {
      circuit,
      limitAmps: continuousLimitWatts(circuit.volts, circuit.breakerAmps, rules.continuousShare) / circuit.volts,
      peakAmps: peak.watts / circuit.volts,
      peakTick: peak.bin * BIN_TICKS,
      fullAmps: onIt.reduce((total, light) => total + light.watts, 0) / circuit.volts,
      lights: onIt.map((light) => light.index),
    };
  });
}

interface Peak {
  readonly bin: number;
  readonly watts: number;
}

const recallPeak = createRecall<Peak>();

/** The first bin in which these lights take most watts. */
function findPeak(facts: readonly LightFacts[], lights: readonly Light[], bins: number): Peak {
  const wattsOf = new Map<LightFacts, number>();
  for (const { index, watts } of lights) {
    const own = facts[index];
    if (own?.isLit === true) wattsOf.set(own, (wattsOf.get(own) ?? 0) + watts);
  }
  const sum = new Float64Array(bins);
  for (const [{ highest }, watts] of wattsOf)
    for (let bin = 0; bin < bins; bin++) sum[bin] = (sum[bin] ?? 0) + (watts * (highest[bin] ?? 0)) / 100;
  let peak = 0;
  for (let bin = 1; bin < bins; bin++) if ((sum[bin] ?? 0) > (sum[peak] ?? 0)) peak = bin;
  return { bin: peak, watts: sum[peak] ?? 0 };
}

const PLANNING_AID = "This is a planning aid: lamp plates and a licensed electrician decide.";

/** Finds circuits on which the show takes more than 80 % of the breaker, and those on which everything at once would. */
export function findLoads(context: CheckContext): Finding[] {
  return listCircuitLoads(context).flatMap((load) => {
    const { circuit, limitAmps, peakAmps, peakTick, fullAmps } = load;
    // Watts are sums of shares; a millionth over the limit is the limit.
    const isOver = (amps: number) => amps > limitAmps * (1 + 1e-6);
    if (isOver(peakAmps)) {
      const { lights, lines } = lightsAt(context, load);
      return [
        buildFinding(context, "circuit-overload", {
          sentence: `The circuit "${circuit.id}" takes ${inAmps(peakAmps)} in ${nameBar(context.song, peakTick)}. It may take ${inAmps(limitAmps)}.`,
          hint: `Light fewer lights at once, or use lower levels. ${PLANNING_AID}`,
          measured: { value: round(peakAmps), limit: round(limitAmps), unit: "A" },
          moments: [peakTick],
          lights,
          lines,
        }),
      ];
    }
    if (isOver(fullAmps))
      return [
        buildFinding(context, "circuit-everything-on", {
          sentence: `With every light on, the circuit "${circuit.id}" takes ${inAmps(fullAmps)}. It may take ${inAmps(limitAmps)}.`,
          hint: `The show itself stays below that. Move lights to another circuit. ${PLANNING_AID}`,
          measured: { value: round(fullAmps), limit: round(limitAmps), unit: "A" },
          lights: load.lights,
        }),
      ];
    return [];
  });
}

function lightsAt(
  context: CheckContext,
  { peakTick, lights }: CircuitLoad,
): { readonly lights: number[]; readonly lines: number[] } {
  const frame = createLightsCursor(context.timeline, context.lights, context.tracks).seek(peakTick + BIN_TICKS / 2);
  const lit = lights.filter((light) => (frame.cue[light] ?? -1) >= 0);
  return { lights: lit, lines: lit.map((light) => lineOfCue(context, frame.cue[light] ?? 0)) };
}

const round = (amps: number) => Math.round(amps * 10) / 10;
const inAmps = (amps: number) => `${round(amps)} A`;
