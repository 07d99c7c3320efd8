import type { Finding, Severity } from "../engine/model.ts";
import { findColourNeverLit } from "./colour-never-lit.ts";
import type { Timeline } from "../timeline/model.ts";
import { openSetting, type CheckContext, type CheckInput, type CheckSetting } from "./context.ts";
import { findColourNotShown } from "./colour-not-shown.ts";
import { findFadeCut } from "./fade-cut.ts";
import { MOST_PLACES } from "./finding.ts";
import { findFit } from "./fit.ts";
import { findInrush } from "./inrush.ts";
import { findLoads } from "./load.ts";
import { findNeverSeen } from "./never-seen.ts";
import { findNeverSwitches } from "./never-switches.ts";
import { findOffGrid } from "./off-grid.ts";
import { findPictureFlashes } from "./picture-flash.ts";
import { findStreetFlashes } from "./street-flash.ts";
import { findHalfCycle, findRelayDwell, findRelayRate, findRelayWear } from "./switching.ts";

/** Every rule of the show check. */
const RULES: readonly ((context: CheckContext) => Finding[])[] = [
  findStreetFlashes,
  findPictureFlashes,
  findLoads,
  findInrush,
  findFit,
  findRelayDwell,
  findRelayRate,
  findRelayWear,
  findHalfCycle,
  findNeverSwitches,
  findNeverSeen,
  findFadeCut,
  findColourNeverLit,
  findColourNotShown,
  findOffGrid,
];

const RANK: Readonly<Record<Severity, number>> = { stop: 0, warn: 1, note: 2 };

/**
 * Gives everything that the show check finds in a timeline on its layout, with its song, by the
 * event's rules: stops first, then warnings, then notes. A stop may not be forwarded or scheduled;
 * nothing here ever blocks handing in. Throws `RangeError` when the timeline is for another number
 * of lights. The same input gives the same findings.
 */
export function checkShow({ timeline, ...setting }: CheckInput): Finding[] {
  return createShowCheck(setting)(timeline);
}

/**
 * Gives a check of one show after another on the same square, song and rules, which works out again
 * only what changed since the last one: for a script that is edited. The findings are those of `checkShow`.
 */
export function createShowCheck(setting: CheckSetting): (timeline: Timeline) => Finding[] {
  const open = openSetting(setting);
  return (timeline) => {
    const context = open(timeline);
    return mergeFindings(RULES.map((rule) => rule(context)));
  };
}

/**
 * Gives several lists of findings as one: stops first, each severity in the order given. Findings of
 * one rule with the same sentence become one, with the places of both.
 */
export function mergeFindings(lists: readonly (readonly Finding[])[]): Finding[] {
  const merged = new Map<string, Finding>();
  for (const finding of lists.flat()) {
    const key = `${finding.rule}\n${finding.sentence}`;
    const known = merged.get(key);
    merged.set(key, known === undefined ? finding : joinFindings(known, finding));
  }
  return [...merged.values()].sort((a, b) => RANK[a.severity] - RANK[b.severity]);
}

function joinFindings(a: Finding, b: Finding): Finding {
  const once = (numbers: readonly number[]) => [...new Set(numbers)].sort((x, y) => x - y);
  return {
    ...a,
    severity: RANK[a.severity] <= RANK[b.severity] ? a.severity : b.severity,
    moments: once([...a.moments, ...b.moments]).slice(0, MOST_PLACES),
    lights: [...new Set([...a.lights, ...b.lights])].slice(0, MOST_PLACES),
    lines: once([...a.lines, ...b.lines]),
  };
}

/** Says whether findings forbid forwarding and scheduling. */
export function hasStop(findings: readonly Finding[]): boolean {
  return findings.some(({ severity }) => severity === "stop");
}
