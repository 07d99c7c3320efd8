import { runKillRounds } from "./kill-rounds.ts";

// node --import tsx tests/crash/kill-during-saves.ts [rounds]
const rounds = Number(process.argv[2] ?? 50);
if (!Number.isInteger(rounds) || rounds < 1) {
  console.error("The number of kills is a whole number from 1: kill-during-saves.ts 50");
  process.exit(2);
}
const report = await runKillRounds(rounds, (line) => console.log(line));
for (const fault of report.faults) console.error(fault);
console.log(
  `${report.kills} kills, ${report.acknowledged} saves acknowledged, ${report.answeredAgain} answered again, ${report.faults.length} faults`,
);
process.exit(report.faults.length === 0 ? 0 : 1);
