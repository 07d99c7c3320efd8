import { TICKS_PER_BEAT } from "../../shared/units.ts";
import type { Finding } from "../engine/model.ts";
import { BIN_TICKS, litBins } from "./bins.ts";
import type { CheckContext } from "./context.ts";
import { buildFinding } from "./finding.ts";
import { countWord, nameBar } from "../timeline/words.ts";

/** Whether a show fits its song: whole, of the song's length, and not dark for long. */
export function findFit(context: CheckContext): Finding[] {
  const { timeline, tempo } = context;
  const findings: Finding[] = [];
  if (!timeline.isComplete)
    findings.push(
      buildFinding(context, "incomplete", {
        sentence: "The script stopped half way, so the show is not whole.",
        hint: "Fix the problem in the script and run it again.",
        moments: timeline.cues.count > 0 ? [timeline.cues.tick[timeline.cues.count - 1] ?? 0] : [],
      }),
    );
  if (timeline.endTick !== tempo.endTick)
    findings.push(
      buildFinding(context, "wrong-length", {
        sentence: `The show is made for ${countWord(timeline.endTick / TICKS_PER_BEAT, "beat")}, but the song has ${tempo.endTick / TICKS_PER_BEAT}.`,
        hint: "Run the script again with the song as it is now.",
        measured: { value: timeline.endTick / TICKS_PER_BEAT, limit: tempo.endTick / TICKS_PER_BEAT, unit: "beats" },
      }),
    );
  const lit = litBins(context);
  const first = lit.indexOf(1);
  const last = lit.lastIndexOf(1);
  if (first < 0) {
    findings.push(
      buildFinding(context, "nothing-lit", {
        sentence: "No light comes on in this show.",
        hint: "Start with `square.all.on();`.",
      }),
    );
    return findings;
  }
  return [...findings, ...findDarkness(context, lit, first, last), ...findDarkFronts(context)];
}

function findDarkness(context: CheckContext, lit: Uint8Array, first: number, last: number): Finding[] {
  const { tempo, rules, timeline } = context;
  const findings: Finding[] = [];
  const seconds = (bin: number) => tempo.toSeconds(Math.min(bin * BIN_TICKS, timeline.endTick));
  const total = tempo.endSeconds - tempo.toSeconds(0);
  const share = (seconds(last + 1) - tempo.toSeconds(0)) / total;
  if (share < rules.leastLengthShare)
    findings.push(
      buildFinding(context, "ends-early", {
        sentence: `The square is dark after ${nameBar(context.song, last * BIN_TICKS)}, but the song plays on.`,
        hint: "Use `song.end` or `song.bars` to fill the song.",
        measured: {
          value: Math.round(share * 100),
          limit: Math.round(rules.leastLengthShare * 100),
          unit: "% of the song",
        },
        moments: [(last + 1) * BIN_TICKS],
      }),
    );
  const lengthOf = ([start, end]: readonly [number, number]) => seconds(end) - seconds(start);
  const dark = listDark(lit, first, last).filter((stretch) => lengthOf(stretch) > rules.longestDarkSeconds);
  const [longestDark] = dark.toSorted((a, b) => lengthOf(b) - lengthOf(a));
  if (longestDark !== undefined) {
    const longest = lengthOf(longestDark);
    const where =
      longestDark[0] === 0 ? "at the start" : `after ${nameBar(context.song, (longestDark[0] - 1) * BIN_TICKS)}`;
    findings.push(
      buildFinding(context, "long-dark", {
        sentence: `The square is dark for ${Math.round(longest)} seconds ${where}.`,
        measured: { value: Math.round(longest), limit: rules.longestDarkSeconds, unit: "s" },
        moments: dark.map(([start]) => start * BIN_TICKS),
      }),
    );
  }
  return findings;
}

/** Dark stretches (bins, end outside) from the start up to the last light. */
function listDark(lit: Uint8Array, first: number, last: number): (readonly [number, number])[] {
  const stretches: (readonly [number, number])[] = first > 0 ? [[0, first]] : [];
  let start = -1;
  for (let bin = first; bin <= last; bin++) {
    if (lit[bin] === 0 && start < 0) start = bin;
    if (lit[bin] === 1 && start >= 0) {
      stretches.push([start, bin]);
      start = -1;
    }
  }
  return stretches;
}

function findDarkFronts(context: CheckContext): Finding[] {
  const facts = context.facts();
  const litFronts = new Set(context.lights.filter(({ index }) => facts[index]?.isLit).map(({ frontId }) => frontId));
  const darkLights = context.lights.filter((light) => !litFronts.has(light.frontId));
  const dark = new Map(darkLights.map((light) => [light.frontId, light.frontName]));
  if (dark.size === 0) return [];
  const names = [...dark.values()];
  return [
    buildFinding(context, "dark-fronts", {
      sentence: `${dark.size === 1 ? `The front "${names[0]}" stays` : `${dark.size} fronts stay`} dark all the time.`,
      measured: { value: dark.size, limit: 0, unit: "fronts" },
      lights: darkLights.map((light) => light.index),
    }),
  ];
}
