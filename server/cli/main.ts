import { ProblemError } from "../../shared/problem.ts";
import { backup } from "./backup.ts";
import { type Command, UsageError } from "./command.ts";
import { check } from "./check.ts";
import { restore } from "./restore.ts";
import { run } from "./run.ts";
import { seed } from "./seed.ts";
import { userAdd } from "./user-add.ts";

const EXIT_FAILED = 1;
const EXIT_USAGE = 2;

/** In the order of `help`. Each reads the same environment as the server (DATA_DIR above all). */
const COMMANDS: readonly Command[] = [run, check, backup, restore, userAdd, seed];

function sayHelp(): void {
  console.log("npm run -s duskbell -- COMMAND\n");
  for (const command of COMMANDS) console.log(`  ${command.usage}\n      ${command.summary}\n`);
  console.log("DATA_DIR names the folder of the database (var, unless set).");
}

async function runCommand(words: readonly string[]): Promise<number> {
  if (words.length === 0 || words[0] === "help" || words[0] === "--help") {
    sayHelp();
    return words.length === 0 ? EXIT_USAGE : 0;
  }
  const typed = words.join(" ");
  const command = COMMANDS.find(({ name }) => typed === name || typed.startsWith(`${name} `));
  if (!command) throw new UsageError(`There is no command "${words[0]}". Try: npm run -s duskbell -- help`);
  return command.run(words.slice(command.name.split(" ").length), (line) => console.log(line));
}

try {
  process.exitCode = await runCommand(process.argv.slice(2));
} catch (error) {
  const isTyped = error instanceof UsageError || error instanceof ProblemError;
  console.error(error instanceof Error ? error.message : error);
  process.exitCode = isTyped ? EXIT_USAGE : EXIT_FAILED;
}
