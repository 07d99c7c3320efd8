import { createRunPool } from "../runs/run-pool.ts";
import type { TimedOutcome } from "../runs/messages.ts";
import { type Command, parseOptions } from "./command.ts";
import { buildRunInput, getFile, RUN_OPTIONS, COMMAND_DEADLINE_MS } from "./run-input.ts";

const EXIT_STOPPED = 1;

/** `run`: one script with the server's own engine. Exit code 1 when a problem stops it. */
export const run: Command = {
  name: "run",
  usage: "run FILE.ts [--song frost-fair] [--layout demo] [--seed 1] [--json]",
  summary: "Runs a script and says what came of it: cues, hash, fuel and time, or the problem with its line.",
  async run(args, say) {
    const { values, flags, rest } = parseOptions(args, { values: RUN_OPTIONS, flags: ["json"] });
    const input = buildRunInput(getFile(rest, "run"), values);
    const runs = createRunPool({ threads: 1, deadlineMs: COMMAND_DEADLINE_MS });
    try {
      const outcome = await runs.run(input);
      for (const line of flags.has("json") ? [JSON.stringify(toJson(outcome))] : describe(outcome)) say(line);
      return outcome.ok ? 0 : EXIT_STOPPED;
    } finally {
      await runs.close();
    }
  },
};

/** The outcome without its timeline, for programs. */
function toJson(outcome: TimedOutcome) {
  const { fuel, cueCount, notes, findings, engineMs } = outcome;
  const end = outcome.ok ? { ok: true, hash: outcome.hash } : { ok: false, problem: outcome.problem };
  return { ...end, cueCount, fuel, engineMs, notes, findings };
}

function describe(outcome: TimedOutcome): string[] {
  const notes = outcome.notes.map((note) => `  line ${note.line}: ${note.text}`);
  const counted = `${outcome.cueCount} cues, ${outcome.fuel} polls of fuel, ${outcome.engineMs.toFixed(0)} ms`;
  if (outcome.ok) return [`It runs: ${counted}`, `hash ${outcome.hash}`, ...notes];
  const { code, sentence, hint, range } = outcome.problem;
  return [
    `It stops in line ${range.line}, column ${range.column} (${code}): ${sentence}`,
    `Try: ${hint}`,
    counted,
    ...notes,
  ];
}
