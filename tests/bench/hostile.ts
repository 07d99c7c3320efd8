import { readFileSync, readdirSync } from "node:fs";
import { openChromiumLab, openEnginePage } from "../engine-hosts/chromium-lab.ts";
import { openNodeLab } from "../engine-hosts/node-lab.ts";
import { listJobs, runRound } from "../hostile/round.ts";
import { HOSTILE_SCRIPTS } from "../hostile/scripts/index.ts";
import type { Figure } from "./measure.ts";

const ROUNDS = 10;
const LANES = 2;
const MEGABYTE = 1024 * 1024;
const PAGE_BYTES = 4096;

/** Resident bytes of this process and all below it, as Linux tells them in /proc. */
function residentBytes(): number {
  const parents = new Map<number, number>();
  for (const name of readdirSync("/proc")) {
    if (!/^\d+$/.test(name)) continue;
    try {
      const [, rest = ""] = readFileSync(`/proc/${name}/stat`, "utf8").split(") ");
      parents.set(Number(name), Number(rest.split(" ")[1]));
    } catch {
      // It ended meanwhile.
    }
  }
  const isBelow = (pid: number | undefined): boolean =>
    pid === process.pid || (pid !== undefined && pid > 1 && isBelow(parents.get(pid)));
  let bytes = 0;
  for (const pid of parents.keys()) {
    if (!isBelow(pid)) continue;
    try {
      bytes += Number(readFileSync(`/proc/${pid}/statm`, "utf8").split(" ")[1]) * PAGE_BYTES;
    } catch {
      // As above.
    }
  }
  return bytes;
}

/** Rounds of the hostile scripts on both hosts; the memory after each, and how much the last is above the second. */
export async function benchHostile(rounds = ROUNDS, scripts = HOSTILE_SCRIPTS): Promise<Figure[]> {
  const page = await openEnginePage();
  const labs = await Promise.all([openNodeLab(LANES), openChromiumLab(page)]);
  const curve: number[] = [];
  let wrong = 0;
  let workers = 0;
  try {
    for (let seed = 1; seed <= rounds; seed++) {
      for (const lab of labs) {
        const jobs = listJobs(scripts);
        const results = await runRound(lab, jobs, { lanes: LANES, seed });
        for (const { way, script } of jobs) if (results.get(`${way}: ${script.name}`)?.end.end !== script[way]) wrong++;
      }
      curve.push(residentBytes() / MEGABYTE);
    }
    for (const lab of labs) workers = Math.max(workers, await lab.countWorkers());
  } finally {
    await Promise.all(labs.map((lab) => lab.close()));
    page.close();
  }
  // The first round warms up: children, workers and their spares are there only after it.
  const growth = (curve.at(-1) ?? 0) - (curve[1] ?? curve[0] ?? 0);
  const alone = { against: null, ratio: null };
  return [
    ...curve.map((value, round) => ({ name: `memory after hostile round ${round + 1}`, value, unit: "MB", ...alone })),
    { name: "memory growth over the hostile rounds (aim below 50)", value: growth, unit: "MB", ...alone },
    { name: "hostile runs that ended otherwise than expected", value: wrong, unit: "runs", ...alone },
    { name: "workers alive after the hostile rounds", value: workers, unit: "workers", ...alone },
  ];
}
