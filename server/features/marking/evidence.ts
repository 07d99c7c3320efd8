import { REQUIREMENT_NAMES, type Requirement, type Rubric } from "../../../shared/contracts/assignments.ts";
import type { Evidence } from "../../../shared/contracts/marking.ts";
import { type EvidenceTopic, gatherEvidence } from "../../../sandbox/checks/evidence.ts";
import { listUnmet, listUses } from "../../../sandbox/checks/use.ts";
import { decodeTimeline } from "../../../sandbox/timeline/codec.ts";
import type { Db } from "../../db/connection.ts";
import { getBeatMap } from "../../event/song.queries.ts";
import { getLayout } from "../../event/square.queries.ts";
import type { RunRow, VersionRow } from "../../show-runs/runs.queries.ts";

/** Words in a criterion's id or name that say which facts help to judge it. */
const TOPIC_WORDS: readonly (readonly [EvidenceTopic, RegExp])[] = [
  ["music", /music|song|beat|tim(e|ing)|rhythm/i],
  ["code", /code|loop|function|script|program|condition|list/i],
  ["coverage", /square|front|cover|street|everywhere|space/i],
  ["dynamics", /dynamic|build|shape|grow|contrast|light|colour|mood|idea/i],
  ["safety", /safe|ready|box|load|check/i],
];

/** Under this key stand the facts that belong to no one criterion. */
const WHOLE = "";

/**
 * Counted facts for whoever marks, by criterion id, and under "" those of the whole: what the
 * assignment asked for and what no criterion takes. Facts are no verdict. Without a timeline only the
 * script is counted.
 */
export function listEvidence(
  db: Db,
  version: VersionRow,
  run: RunRow | null,
  { rubric, requirements }: { readonly rubric: Rubric; readonly requirements: readonly Requirement[] },
): Record<string, Evidence[]> {
  const evidence: Record<string, Evidence[]> = {
    [WHOLE]: requirements.map((requirement) => toFact(version.source, requirement)),
  };
  const add = (key: string, fact: Evidence) => (evidence[key] = [...(evidence[key] ?? []), fact]);
  if (!run?.timeline) return evidence;
  const facts = gatherEvidence({
    source: version.source,
    timeline: decodeTimeline(run.timeline),
    layout: getLayout(db, run.layoutId).layout,
    song: getBeatMap(db, run.beatMapId),
  });
  for (const { topic, kind, text, lines, moments } of facts)
    add(findCriterion(rubric, topic), { kind, text, lines, moments });
  return evidence;
}

function toFact(source: string, requirement: Requirement): Evidence {
  const uses = listUses(source).filter((use) => use.kind === requirement.kind);
  const isMet = listUnmet(source, [requirement]).length === 0;
  const asked =
    requirement.atLeast === 1
      ? REQUIREMENT_NAMES[requirement.kind]
      : `${REQUIREMENT_NAMES[requirement.kind]}, ${requirement.atLeast} times`;
  const found = uses.length === 0 ? "not found" : `found ${uses.length === 1 ? "once" : `${uses.length} times`}`;
  return {
    kind: isMet ? "tick" : "triangle",
    text: `Asked for: ${asked}; ${found}.`,
    lines: [...new Set(uses.map((use) => use.line))],
    moments: [],
  };
}

/** The first criterion whose id or name speaks of the topic. */
function findCriterion(rubric: Rubric, topic: EvidenceTopic): string {
  const words = TOPIC_WORDS.find(([one]) => one === topic)?.[1];
  return rubric.find(({ id, name }) => words?.test(`${id} ${name}`))?.id ?? WHOLE;
}
