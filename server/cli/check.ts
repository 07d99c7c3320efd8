import type { Finding, RunInput } from "../../sandbox/engine/model.ts";
import { listNames } from "../../sandbox/engine/tables.ts";
import { createScriptService } from "../../sandbox/language/type-check.ts";
import { listTypeNotes } from "../../sandbox/language/type-notes.ts";
import { createRunPool, type RunPool } from "../runs/run-pool.ts";
import { type Command, parseOptions, UsageError } from "./command.ts";
import { buildRunInput, RUN_OPTIONS, COMMAND_DEADLINE_MS } from "./run-input.ts";

const EXIT_STOPS = 1;

/** `check`: scripts against the show check. Exit code 1 when one does not run or has a stop. */
export const check: Command = {
  name: "check",
  usage: "check FILE.ts ... [--song frost-fair] [--layout demo] [--seed 1]",
  summary:
    "Runs scripts and lists what the show check finds, and values of the wrong kind. A planning aid: the safety officer decides.",
  async run(args, say) {
    const { values, rest } = parseOptions(args, { values: RUN_OPTIONS });
    if (rest.length === 0) throw new UsageError("check takes at least one script: check my-show.ts --song frost-fair");
    const runs = createRunPool({ threads: 1, deadlineMs: COMMAND_DEADLINE_MS });
    let hasStop = false;
    try {
      for (const file of rest) {
        const { lines, isStopped } = await checkFile(runs, file, values);
        hasStop ||= isStopped;
        for (const line of lines) say(line);
      }
    } finally {
      await runs.close();
    }
    return hasStop ? EXIT_STOPS : 0;
  },
};

async function checkFile(
  runs: RunPool,
  file: string,
  values: ReadonlyMap<string, string>,
): Promise<{ lines: string[]; isStopped: boolean }> {
  const input = buildRunInput(file, values);
  const { problem, findings } = await runs.judge(input);
  if (problem)
    return { lines: [`${file}: does not run. Line ${problem.range.line}: ${problem.sentence}`], isStopped: true };
  const count = (severity: Finding["severity"]) => findings.filter((finding) => finding.severity === severity).length;
  const head = `${file}: ${count("stop")} stops, ${count("warn")} warnings, ${count("note")} notes`;
  return { lines: [head, ...findings.map(describeFinding), ...listKindNotes(input)], isStopped: count("stop") > 0 };
}

/** What the type checker notices; the same words as in the editor. */
function listKindNotes({ source, layout, song }: RunInput): string[] {
  const names = listNames(layout, song);
  const service = createScriptService(names);
  service.setText(source);
  return listTypeNotes(service, names).map(({ sentence, range }) => `  kind: ${sentence} (line ${range.line})`);
}

function describeFinding({ severity, sentence, lines, measured }: Finding): string {
  const where = lines.length > 0 ? ` (line ${lines.join(", ")})` : "";
  const figure = measured ? ` [${measured.value} of ${measured.limit} ${measured.unit}]` : "";
  return `  ${severity}: ${sentence}${figure}${where}`;
}
