import { readFileSync } from "node:fs";
import { createServer } from "node:http";
import type { AddressInfo } from "node:net";
import path from "node:path";
import { setTimeout as sleep } from "node:timers/promises";
import { judgeRun } from "../../sandbox/checks/judge-run.ts";
import { newId } from "../../server/db/schema/columns.ts";
import { beatMaps, songs, squareLayouts, squares } from "../../server/db/schema/index.ts";
import { demoSong } from "../../server/db/seed/world/songs/demo-songs.ts";
import { DEMO_SQUARE } from "../../server/db/seed/world/square.ts";
import { createRunPool, type RunPool } from "../../server/runs/run-pool.ts";
import { buildAssignment, buildClass, buildShow, buildSong, buildSquare, buildUser } from "../support/factories.ts";
import { createTestClock } from "../support/test-clock.ts";
import { createTestServer } from "../support/test-server.ts";
import { type Figure, median, percentile } from "./measure.ts";

const CLASS_SIZE = 30;
const ROUNDS = 3;
/** Somebody reads every few milliseconds meanwhile. */
const READ_EVERY_MS = 5;
const SCRIPT = readFileSync(path.resolve(import.meta.dirname, "../samples/showpiece.ts"), "utf8");

interface Round {
  /** Until the last of the class has its answer. */
  readonly allMs: number;
  readonly reads: readonly number[];
}

/**
 * A class hands its three-minute shows in at one moment while somebody reads a show again and again:
 * with runs judged in the process that makes them (the product) and on the server's own thread.
 */
export async function benchHandIns(): Promise<Figure[]> {
  const pool = createRunPool({ threads: 2, deadlineMs: 60_000 });
  const onOwnThread: RunPool = {
    ...pool,
    run: (input, options) => pool.run(input, options),
    judge: async (input, options) => judgeRun(await pool.run(input, options), input.layout, input.song),
  };
  const rounds = { apart: new Array<Round>(), together: new Array<Round>() };
  try {
    for (let round = 0; round < ROUNDS; round++) {
      rounds.apart.push(await handInAtOnce(pool));
      rounds.together.push(await handInAtOnce(onOwnThread));
    }
  } finally {
    await pool.close();
  }
  const late = (list: readonly Round[]) => median(list.map(({ reads }) => percentile(reads, 0.95)));
  const all = (list: readonly Round[]) => median(list.map(({ allMs }) => allMs));
  const against = "the show check on the server's own thread";
  return [
    {
      name: `95th percentile of a read while ${CLASS_SIZE} hand in`,
      value: late(rounds.apart),
      unit: "ms",
      against,
      ratio: late(rounds.apart) / late(rounds.together),
    },
    {
      name: `${CLASS_SIZE} hand-ins at once, until the last has its answer`,
      value: all(rounds.apart),
      unit: "ms",
      against,
      ratio: all(rounds.apart) / all(rounds.together),
    },
  ];
}

async function handInAtOnce(runs: RunPool): Promise<Round> {
  const portal = createTestServer({ clock: createTestClock(Date.now()), checkResponses: false, runs });
  const server = createServer(portal.app);
  await new Promise<void>((resolve) => server.listen(0, "127.0.0.1", resolve));
  const base = `http://127.0.0.1:${(server.address() as AddressInfo).port}/api`;
  try {
    const { handIns, read } = await prepareClass(portal, base);
    let isDone = false;
    const reads: number[] = [];
    const reading = (async () => {
      while (!isDone) {
        const start = performance.now();
        await read();
        reads.push(performance.now() - start);
        await sleep(READ_EVERY_MS);
      }
    })();
    const start = performance.now();
    await Promise.all(handIns.map((handIn) => handIn()));
    const allMs = performance.now() - start;
    isDone = true;
    await reading;
    return { allMs, reads };
  } finally {
    server.close();
    portal.dispose();
  }
}

async function prepareClass({ db, signIn }: ReturnType<typeof createTestServer>, base: string) {
  const square = buildSquare(db);
  const students = Array.from({ length: CLASS_SIZE }, () => buildUser(db).id);
  const { id: classId } = buildClass(db, { studentIds: students });
  const { id: songId } = buildSong(db);
  const { beatMap } = demoSong("quillhaven-bells");
  const createdAt = Date.now();
  const [layoutId, beatMapId] = [newId(), newId()];
  db.insert(squareLayouts)
    .values({ id: layoutId, squareId: square.squareId, number: 2, hash: layoutId, layout: DEMO_SQUARE, createdAt })
    .run();
  db.update(squares).set({ currentLayoutId: layoutId }).run();
  db.insert(beatMaps).values({ id: beatMapId, songId, number: 2, beatMap, createdAt }).run();
  db.update(songs).set({ currentBeatMapId: beatMapId }).run();
  const assignment = buildAssignment(db, { classId, songId });
  const shows = students.map((student) =>
    buildShow(db, { assignmentId: assignment.id, songId, authorIds: [student], source: SCRIPT }),
  );
  const cookies = await Promise.all(students.map((student) => signIn(student)));
  const call = async (url: string, init: RequestInit & { cookie: string }) => {
    const headers = { cookie: init.cookie, "sec-fetch-site": "same-origin", ...init.headers };
    const response = await fetch(`${base}${url}`, { ...init, headers });
    const text = await response.text();
    if (!response.ok) throw new Error(`${url} answered ${response.status}: ${text.slice(0, 300)}`);
    return text;
  };
  const [first = ""] = cookies;
  return {
    read: () => call(`/shows/${shows[0]?.id}`, { cookie: first }),
    handIns: shows.map((show, index) => async () => {
      const answer = await call(`/assignments/${assignment.id}/submissions`, {
        method: "POST",
        cookie: cookies[index] ?? "",
        headers: { "content-type": "application/json", "idempotency-key": `bench-hand-in-${index}` },
        body: JSON.stringify({ showId: show.id, revision: 1, hash: null }),
      });
      if (!answer.includes('"isOk":true')) throw new Error(`A show did not run: ${answer.slice(0, 300)}`);
    }),
  };
}
