import type { Circuit } from "../../shared/contracts/square.ts";
import type { Finding } from "../engine/model.ts";
import type { Light } from "../square/lights.ts";
import { countWord, nameBar } from "../timeline/words.ts";
import { BIN_TICKS, countBins } from "./bins.ts";
import { createRecall } from "./check-memory.ts";
import type { CheckContext } from "./context.ts";
import { buildFinding, linesAt } from "./finding.ts";
import type { LightFacts } from "./light-facts.ts";

/** The moment at which most watts of a circuit come on at once from dark. */
interface ColdStart {
  readonly tick: number;
  readonly watts: number;
  /** Light indexes. */
  readonly lights: readonly number[];
}

const recallColdStart = createRecall<ColdStart>();

/**
 * Notes circuits on which so many lamps come on at once that filament lamps could trip the breaker: a
 * cold filament takes many times its current for a moment. Colour strips are left out. Which lamps hang
 * on an outlet is not known, so this is a note only, one for all circuits: it names the worst.
 */
export function findInrush(context: CheckContext): Finding[] {
  const { layout, lights, rules, song } = context;
  const over = layout.circuits
    .map((circuit) => {
      const lamps = lights.filter((light) => light.circuit === circuit.id && !light.hasColour);
      const start = getColdStart(context, circuit, lamps);
      const amps = (rules.inrushFactor * start.watts) / circuit.volts;
      return { circuit, start, amps, limit: rules.inrushTimesBreaker * circuit.breakerAmps };
    })
    .filter(({ amps, limit }) => amps > limit)
    .sort((a, b) => b.amps / b.limit - a.amps / a.limit);
  const [worst] = over;
  if (worst === undefined) return [];
  const { circuit, start, amps, limit } = worst;
  const others = over.length === 1 ? "" : ` ${countWord(over.length - 1, "other circuit")} may, too.`;
  return [
    buildFinding(context, "circuit-inrush", {
      sentence: `Old lamps on the circuit "${circuit.id}" may take ${Math.round(amps)} A for a moment in ${nameBar(song, start.tick)}.`,
      hint: `LED lamps do not. Else let them come on one by one.${others} A licensed electrician decides.`,
      measured: { value: Math.round(amps), limit: Math.round(limit), unit: "A" },
      moments: [start.tick],
      lights: start.lights,
      lines: linesAt(context, start.tick, start.lights),
    }),
  ];
}

function getColdStart(context: CheckContext, { id }: Circuit, lamps: readonly Light[]): ColdStart {
  const facts = context.facts();
  return recallColdStart(
    context.memory,
    id,
    lamps.map(({ index }) => facts[index]),
    () => findColdStart(facts, lamps, countBins(context.timeline.endTick)),
  );
}

function findColdStart(facts: readonly LightFacts[], lamps: readonly Light[], bins: number): ColdStart {
  const wattsOf = new Map<LightFacts, number>();
  for (const { index, watts } of lamps) {
    const own = facts[index];
    if (own?.isLit === true) wattsOf.set(own, (wattsOf.get(own) ?? 0) + watts);
  }
  const sum = new Float64Array(bins);
  for (const [{ highest }, watts] of wattsOf)
    for (let bin = 0; bin < bins; bin++)
      if (isStart(highest, bin)) sum[bin] = (sum[bin] ?? 0) + (watts * (highest[bin] ?? 0)) / 100;
  let most = 0;
  for (let bin = 1; bin < bins; bin++) if ((sum[bin] ?? 0) > (sum[most] ?? 0)) most = bin;
  const starting = lamps.filter(({ index }) => isStart(facts[index]?.highest ?? new Float32Array(0), most));
  return { tick: most * BIN_TICKS, watts: sum[most] ?? 0, lights: starting.map(({ index }) => index) };
}

/** Whether a light comes on in a bin and was dark in the one before. */
function isStart(highest: Float32Array, bin: number): boolean {
  return (highest[bin] ?? 0) > 0 && (bin === 0 || (highest[bin - 1] ?? 0) === 0);
}
