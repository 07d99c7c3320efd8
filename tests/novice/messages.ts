import { createShowCheck } from "../../sandbox/checks/index.ts";
import { listNames } from "../../sandbox/engine/tables.ts";
import { createScriptService } from "../../sandbox/language/type-check.ts";
import { listTypeNotes } from "../../sandbox/language/type-notes.ts";
import { demoSong } from "../../server/db/seed/world/songs/demo-songs.ts";
import { DEMO_SQUARE } from "../../server/db/seed/world/square.ts";
import { runScript } from "../support/run-script.ts";

/** Something that the studio says about a script, with the lines it points at. */
export interface Message {
  readonly code: string;
  readonly lines: readonly number[];
  readonly sentence: string;
}

/**
 * What the check says about the square's own business (load, relays, how much of the song and the square is
 * used): true of many right scripts, and no answer to a mistake.
 */
const ABOUT_THE_SQUARE: ReadonlySet<string> = new Set([
  "circuit-inrush",
  "circuit-everything-on",
  "relay-dwell",
  "relay-rate",
  "relay-wear",
  "half-cycle",
  "off-grid",
  "ends-early",
  "long-dark",
  "dark-fronts",
]);

const song = demoSong("quillhaven-bells").beatMap;
const names = listNames(DEMO_SQUARE, song);
const service = createScriptService(names);
const checkShow = createShowCheck({ layout: DEMO_SQUARE, song });

/** Everything that a student would be told of a script: its problem, findings of run and check, notes on kinds. */
export async function listMessages(source: string): Promise<readonly Message[]> {
  const outcome = await runScript(source, { songId: "quillhaven-bells", song, layout: DEMO_SQUARE });
  if (!outcome.ok) {
    const { code, range, sentence } = outcome.problem;
    return [{ code, lines: [range.line], sentence }];
  }
  service.setText(source);
  const notes = listTypeNotes(service, names).map(({ code, range, sentence }) => ({
    code,
    lines: [range.line],
    sentence,
  }));
  const findings = [...outcome.findings, ...checkShow(outcome.timeline)]
    .filter(({ rule }) => !ABOUT_THE_SQUARE.has(rule))
    .map(({ rule, lines, sentence }) => ({ code: rule, lines, sentence }));
  return [...findings, ...notes];
}
