import { TICKS_PER_BEAT } from "../../shared/units.ts";
import type { RunOutcome } from "../engine/model.ts";
import { ACTION_CODE } from "../timeline/model.ts";
import { ColourCounter, showsColour } from "./colour-seen.ts";
import { compareRuns } from "./compare.ts";
import type { CheckOf, ExerciseCheck, LightChoice } from "./exercise.ts";
import { type CheckedRun, SEEN } from "./stage.ts";
import { countQuoted, countUses, countWord } from "./syntax.ts";
import type { Count } from "./syntax.ts";

/** What one check found: what was seen in words, and where. */
export interface Verdict {
  readonly isPassed: boolean;
  readonly seen: string;
  readonly line?: number | null;
  readonly tick?: number | null;
}

/** What the checks look at. `aim` is the run of the aim's script, where the exercise has one. */
export interface Evidence {
  readonly run: CheckedRun;
  readonly aim: CheckedRun | null;
  readonly outcome: RunOutcome;
  readonly source: string;
}

type Rules = { readonly [Kind in ExerciseCheck["kind"]]: (check: CheckOf<Kind>, evidence: Evidence) => Verdict };

const toTick = (beat: number): number => Math.round(beat * TICKS_PER_BEAT);
const toBeat = (tick: number): number => Math.round((tick / TICKS_PER_BEAT) * 100) / 100;
const times = (count: number, one: string, many = `${one}s`): string => `${count} ${count === 1 ? one : many}`;

function nameOf(choice: LightChoice): string {
  if (choice.front !== undefined)
    return choice.part === undefined ? `The ${choice.front}` : `The ${choice.part} of the ${choice.front}`;
  if (choice.side !== undefined)
    return choice.part === undefined ? `The ${choice.side} side` : `The ${choice.part} of the ${choice.side} side`;
  return choice.part === undefined ? "The square" : `The ${choice.part} of the square`;
}

function lit(check: CheckOf<"lit">, { run }: Evidence): Verdict {
  const lights = run.choose(check.lights);
  const frame = run.frameAt(check.atBeat);
  const bright = lights.filter((light) => (frame.level[light.index] ?? 0) >= check.atLeast);
  const isPassed = lights.length > 0 && bright.length >= lights.length * check.share;
  const what =
    bright.length === 0
      ? "dark"
      : bright.length === lights.length
        ? "lit"
        : `lit at ${bright.length} of ${lights.length} lights`;
  return {
    isPassed,
    seen: `${nameOf(check.lights)} was ${what} at beat ${check.atBeat}.`,
    tick: toTick(check.atBeat),
    line: run.lineOf(frame.cue[bright[0]?.index ?? -1] ?? -1),
  };
}

function dark(check: CheckOf<"dark">, { run }: Evidence): Verdict {
  const frame = run.frameAt(check.atBeat);
  const still = run.choose(check.lights).find((light) => (frame.level[light.index] ?? 0) >= SEEN);
  return {
    isPassed: still === undefined,
    seen: `${nameOf(check.lights)} was ${still === undefined ? "dark" : "still lit"} at beat ${check.atBeat}.`,
    tick: toTick(check.atBeat),
    line: still === undefined ? null : run.lineOf(frame.cue[still.index] ?? -1),
  };
}

function colour(check: CheckOf<"colour">, { run }: Evidence): Verdict {
  const frame = run.frameAt(check.atBeat);
  const shining = run
    .choose(check.lights)
    .filter((light) => light.hasColour && (frame.level[light.index] ?? 0) >= SEEN);
  const other = shining.find((light) => !showsColour(frame, light.index, check.colour));
  const isPassed = shining.length > 0 && other === undefined;
  const what = shining.length === 0 ? "dark" : isPassed ? check.colour : `not ${check.colour}`;
  return {
    isPassed,
    seen: `${nameOf(check.lights)} was ${what} at beat ${check.atBeat}.`,
    tick: toTick(check.atBeat),
    line: run.lineOf(frame.cue[(other ?? shining[0])?.index ?? -1] ?? -1),
  };
}

/** Looks for the first pair that does not come one after the other. */
function inOrder(names: readonly string[], run: CheckedRun): Verdict {
  const first = new Map(run.firstLights().map(({ front, tick }) => [front.front.name, tick]));
  for (let n = 0; n < names.length; n += 1) {
    const name = names[n] ?? "";
    const tick = first.get(name) ?? null;
    if (tick === null) return { isPassed: false, seen: `The ${name} was never lit.` };
    const before = names[n - 1];
    const earlier = before === undefined ? null : (first.get(before) ?? null);
    if (before !== undefined && earlier !== null && tick <= earlier) {
      const how = tick === earlier ? "at the same time as" : "before";
      return { isPassed: false, seen: `The ${name} came on ${how} the ${before}.`, tick };
    }
  }
  return { isPassed: true, seen: "They came on one after the other." };
}

function order(check: CheckOf<"order">, { run }: Evidence): Verdict {
  return inOrder(check.fronts, run);
}

function inWalkingOrder(check: CheckOf<"in-walking-order">, { run }: Evidence): Verdict {
  const used = run.firstLights().filter((one) => one.tick !== null);
  if (used.length < check.atLeast) return { isPassed: false, seen: `${times(used.length, "front")} came on.` };
  return inOrder(
    used.map((one) => one.front.front.name),
    run,
  );
}

function frontsLit(check: CheckOf<"fronts-lit">, { run }: Evidence): Verdict {
  const count = run.firstLights().filter((one) => one.tick !== null).length;
  return { isPassed: count >= check.atLeast, seen: `${times(count, "front was", "fronts were")} lit.` };
}

function coloursSeen(check: CheckOf<"colours-seen">, { run }: Evidence): Verdict {
  const counter = new ColourCounter();
  const colourful = run.lights.filter((light) => light.hasColour);
  run.watch((frame) => {
    for (const light of colourful) if ((frame.level[light.index] ?? 0) >= SEEN) counter.add(frame, light.index);
    return counter.count < check.atLeast;
  });
  return {
    isPassed: counter.count >= check.atLeast,
    seen: `${times(counter.count, "colour was", "colours were")} seen.`,
  };
}

function sameAsAim(check: CheckOf<"same-as-aim">, { run, aim }: Evidence): Verdict {
  if (aim === null) return { isPassed: false, seen: "The aim could not be run." };
  const { share, tick, light } = compareRuns(run, aim);
  const percent = Math.round(share * 100);
  if (share <= check.tolerance) return { isPassed: true, seen: "Your ribbon is the aim's ribbon." };
  const frame = run.frameAtTick(tick ?? 0);
  const front = run.lights[light ?? 0]?.frontName ?? "";
  return {
    isPassed: false,
    seen: `${Math.max(1, percent)} % differs. It starts at beat ${toBeat(tick ?? 0)}, at the ${front}.`,
    tick,
    line: run.lineOf(frame.cue[light ?? 0] ?? -1),
  };
}

function cueCount(check: CheckOf<"cue-count">, { run }: Evidence): Verdict {
  const { cues } = run.timeline;
  const wanted = check.action === undefined ? null : ACTION_CODE[check.action];
  let count = 0;
  for (let cue = 0; cue < cues.count; cue += 1) if (wanted === null || cues.action[cue] === wanted) count += 1;
  const isPassed = count >= check.atLeast && count <= (check.atMost ?? Number.POSITIVE_INFINITY);
  return {
    isPassed,
    seen:
      check.action === undefined
        ? `The lights changed ${times(count, "time")}.`
        : `\`${check.action}\` ran ${times(count, "time")}.`,
  };
}

function lastsUntil(check: CheckOf<"lasts-until">, { run }: Evidence): Verdict {
  const { cues } = run.timeline;
  const last = cues.count === 0 ? null : (cues.tick[cues.count - 1] ?? 0);
  return {
    isPassed: last !== null && last >= toTick(check.beat),
    seen: last === null ? "Nothing changed." : `The last change was at beat ${toBeat(last)}.`,
    tick: last,
  };
}

function darkAtTheEnd(_: CheckOf<"dark-at-the-end">, { run }: Evidence): Verdict {
  const frame = run.frameAtTick(run.timeline.endTick - 1);
  const still = run.lights.find((light) => (frame.level[light.index] ?? 0) >= SEEN);
  if (still === undefined)
    return {
      isPassed: run.timeline.cues.count > 0,
      seen: run.timeline.cues.count > 0 ? "All was dark at the end." : "Nothing was ever lit.",
    };
  return {
    isPassed: false,
    seen: `The ${still.frontName} stayed lit.`,
    line: run.lineOf(frame.cue[still.index] ?? -1),
    tick: run.timeline.endTick - 1,
  };
}

function note(check: CheckOf<"note">, { outcome }: Evidence): Verdict {
  const { notes } = outcome;
  const match = check.says === undefined ? notes[0] : notes.find((one) => one.text === check.says);
  const first = notes[0];
  const seen = first === undefined ? "No notes were printed." : `The first note says "${first.text.slice(0, 40)}".`;
  return {
    isPassed: notes.length >= check.atLeast && (check.says === undefined || match !== undefined),
    seen,
    line: match?.line ?? first?.line ?? null,
    tick: match?.tick ?? first?.tick ?? null,
  };
}

const USE_NAMES = {
  "for-of": "a `for..of` loop",
  for: "a `for` loop",
  variable: "a variable",
  "changing-variable": "a new value for a variable",
  constant: "a `const`",
  function: "a function",
  if: "an `if`",
  "nested-loop": "a loop in a loop",
} as const;

function counted(found: Count, atLeast: number, atMost: number | undefined, name: string): Verdict {
  const isPassed = found.count >= atLeast && found.count <= (atMost ?? Number.POSITIVE_INFINITY);
  const line = found.count > atLeast ? found.lines.at(-1) : found.lines[0];
  return {
    isPassed,
    seen:
      found.count === 0 ? `I found no ${name.replace(/^an? /, "")}.` : `I found ${name} ${times(found.count, "time")}.`,
    line: line ?? null,
  };
}

const RULES: Rules = {
  lit,
  dark,
  colour,
  order,
  "in-walking-order": inWalkingOrder,
  "fronts-lit": frontsLit,
  "colours-seen": coloursSeen,
  "same-as-aim": sameAsAim,
  "cue-count": cueCount,
  "lasts-until": lastsUntil,
  "dark-at-the-end": darkAtTheEnd,
  note,
  uses: (check, { source }) => counted(countUses(source, check.what), check.atLeast, undefined, USE_NAMES[check.what]),
  word: (check, { source }) => counted(countWord(source, check.word), check.atLeast, check.atMost, `\`${check.word}\``),
  quoted: (check, { source }) =>
    counted(countQuoted(source, check.quoted), check.atLeast, check.atMost, `"${check.quoted}"`),
};

/** What a check finds in a run. */
export function judge(check: ExerciseCheck, evidence: Evidence): Verdict {
  // The table has exactly one rule for each kind, which the compiler can not follow through an index.
  const rule = RULES[check.kind] as (check: ExerciseCheck, evidence: Evidence) => Verdict;
  return rule(check, evidence);
}
