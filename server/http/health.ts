import type { RequestHandler } from "express";
import type { Connection } from "../db/connection.ts";
import type { Clock } from "../clock.ts";
import type { RunPool } from "../runs/run-pool.ts";

/** How long one answer of the run pool counts: probes come every few seconds from several places. */
const POOL_ANSWER_LIFE_MS = 10_000;
const PROBE_TIMEOUT_MS = 5_000;

/** The process is up and answers; says nothing about what it needs. */
export const healthz: RequestHandler = (_req, res) => {
  res.type("text/plain").send("ok\n");
};

/** One beat on one light: the least that a run needs. */
const PROBE: Parameters<RunPool["run"]>[0] = {
  source: "",
  songId: "probe",
  song: {
    version: 1,
    beats: [0, 500_000],
    beatsPerBar: 1,
    bars: [{ number: 1, start: 0, beats: 1 }],
    sections: [],
    instruments: [],
    loudness: [0, 0, 0, 0],
  },
  layout: {
    version: 1,
    name: "Probe",
    mains: { volts: 120, hertz: 60 },
    circuits: [{ id: "a", volts: 120, breakerAmps: 15 }],
    fronts: [
      {
        id: "probe",
        name: "probe",
        side: null,
        order: 0,
        silhouette: {
          width: 1,
          eave: 0.5,
          top: 0.8,
          roof: "tree",
          floors: 1,
          bays: 1,
          window: "sash",
          ground: "door",
          awning: 0,
          chimney: 0,
          sign: false,
        },
        boxes: [{ id: "box", kind: "dimmer", outlets: [{ number: 1, part: "all", watts: 1, circuit: "a" }] }],
      },
    ],
  },
  seed: 0,
};

/**
 * Ready to take requests: the database answers and the run pool finishes a run. 503 with the part
 * that does not answer otherwise. The pool is asked at most every ten seconds.
 */
export function readyz(options: { connection: Connection; runs: RunPool; clock: Clock }): RequestHandler {
  let poolAnsweredAt = Number.NEGATIVE_INFINITY;
  return async (_req, res) => {
    const isDatabaseUp = answersQuery(options.connection);
    if (options.clock.now() - poolAnsweredAt >= POOL_ANSWER_LIFE_MS && (await finishesRun(options.runs))) {
      poolAnsweredAt = options.clock.now();
    }
    const isPoolUp = options.clock.now() - poolAnsweredAt < POOL_ANSWER_LIFE_MS;
    res.setHeader("Cache-Control", "no-store");
    res.status(isDatabaseUp && isPoolUp ? 200 : 503).json({ database: isDatabaseUp, runs: isPoolUp });
  };
}

function answersQuery({ sqlite }: Connection): boolean {
  try {
    return sqlite.prepare("select 1").pluck().get() === 1;
  } catch {
    return false;
  }
}

async function finishesRun(runs: RunPool): Promise<boolean> {
  let timer: NodeJS.Timeout | undefined;
  const tooLate = new Promise<false>((resolve) => {
    timer = setTimeout(() => resolve(false), PROBE_TIMEOUT_MS);
  });
  const finished = runs.run(PROBE, { classId: "probe" }).then(
    () => true,
    () => false,
  );
  const isUp = await Promise.race([finished, tooLate]);
  clearTimeout(timer);
  return isUp;
}
