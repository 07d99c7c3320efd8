import { type ChildProcess, spawn } from "node:child_process";
import { once } from "node:events";
import { mkdtempSync, rmSync } from "node:fs";
import { tmpdir } from "node:os";
import { join, resolve } from "node:path";
import { eq } from "drizzle-orm";
import { systemClock } from "../../server/clock.ts";
import { type Connection, openDatabase } from "../../server/db/connection.ts";
import { drafts } from "../../server/db/schema/index.ts";
import { createSessions } from "../../server/identity/sessions.ts";
import { DATABASE_FILE, openDataDir } from "../../server/start-server.ts";
import { buildShow, buildSquare, buildUser } from "../support/factories.ts";
import { SAME_ORIGIN } from "../support/test-server.ts";

const MAIN = resolve(import.meta.dirname, "../../server/main.ts");
const WRITERS = 30;
/** The kill comes so long after the first answer: between the first saves and many. */
const KILL_AFTER_MS = { least: 10, most: 1500 };
const FIRST_ANSWER_LIMIT_MS = 30_000;

interface Save {
  readonly revision: number;
  readonly source: string;
  readonly key: string;
}

interface Writer {
  readonly number: number;
  readonly showId: string;
  readonly cookie: string;
  /** The last save that the server acknowledged. */
  acked: Save;
  /** Sent and not answered when the server died; sent again, with its key, to the next one. */
  inFlight: Save | null;
}

export interface KillReport {
  readonly kills: number;
  readonly acknowledged: number;
  /** Saves that had reached the disk unanswered, and were answered when sent again. */
  readonly answeredAgain: number;
  /** What was wrong; empty when nothing was lost. */
  readonly faults: string[];
}

/**
 * Starts the real server, lets 30 students save without pause, kills it with SIGKILL at a random
 * moment, and looks into the file; so many rounds on one database. Nothing acknowledged may be lost,
 * a save that was under way is there whole or not at all, and the file is sound.
 */
export async function runKillRounds(
  rounds: number,
  say: (line: string) => void = () => undefined,
): Promise<KillReport> {
  const folder = mkdtempSync(join(tmpdir(), "duskbell-kill-"));
  try {
    const writers = await buildWriters(folder);
    const report = { kills: 0, acknowledged: 0, answeredAgain: 0, faults: new Array<string>() };
    for (let round = 0; round < rounds && report.faults.length === 0; round++) {
      const server = await startServer(folder);
      const saving = writers.map((writer) => saveUntilDead(server.address, writer, report));
      await waitForAnswer(report);
      await delay(KILL_AFTER_MS.least + Math.random() * (KILL_AFTER_MS.most - KILL_AFTER_MS.least));
      server.child.kill("SIGKILL");
      await once(server.child, "exit");
      await Promise.all(saving);
      report.kills++;
      report.faults.push(...findFaults(folder, writers));
      say(
        `kill ${report.kills}: ${report.acknowledged} saves acknowledged, ${report.answeredAgain} answered again, ${report.faults.length} faults`,
      );
    }
    return report;
  } finally {
    rmSync(folder, { recursive: true, force: true });
  }
}

async function waitForAnswer(report: {
  readonly acknowledged: number;
  readonly faults: readonly string[];
}): Promise<void> {
  const before = report.acknowledged;
  const until = performance.now() + FIRST_ANSWER_LIMIT_MS;
  while (report.acknowledged === before && report.faults.length === 0) {
    if (performance.now() > until) throw new Error("The server listened and answered no save.");
    await delay(5);
  }
}

async function buildWriters(folder: string): Promise<Writer[]> {
  const connection = openDataDir(folder);
  const { db } = connection;
  buildSquare(db);
  const sessions = createSessions(db, systemClock, { isSecure: false });
  const writers: Writer[] = [];
  for (let number = 0; number < WRITERS; number++) {
    const userId = buildUser(db).id;
    const source = `// writer ${number}, save 0\n`;
    const showId = buildShow(db, { authorIds: [userId], source, revision: 0 }).id;
    const { cookie } = await sessions.open(userId);
    writers.push({
      number,
      showId,
      cookie: cookie.split(";")[0] ?? "",
      acked: { revision: 0, source, key: "" },
      inFlight: null,
    });
  }
  connection.close();
  return writers;
}

async function startServer(folder: string): Promise<{ child: ChildProcess; address: string }> {
  const child = spawn(process.execPath, ["--import", "tsx", MAIN], {
    env: {
      ...process.env,
      PORT: "0",
      HOST: "127.0.0.1",
      DATA_DIR: folder,
      DEMO_WORLD: "false",
      LOG_LEVEL: "error",
      RUN_THREADS: "1",
      NODE_ENV: "test",
    },
    stdio: ["ignore", "pipe", "pipe"],
  });
  let printed = "";
  let complaints = "";
  child.stderr.on("data", (chunk: Buffer) => (complaints += chunk.toString()));
  const address = await new Promise<string>((found, failed) => {
    child.stdout.on("data", (chunk: Buffer) => {
      printed += chunk.toString();
      const match = /http:\/\/127\.0\.0\.1:\d+/.exec(printed);
      if (match) found(match[0]);
    });
    child.once("exit", (code) => failed(new Error(`The server ended with ${code} before it listened:\n${complaints}`)));
  });
  return { child, address };
}

/** Saves one revision after the other until the server stops answering. */
async function saveUntilDead(
  address: string,
  writer: Writer,
  report: { acknowledged: number; answeredAgain: number; faults: string[] },
): Promise<void> {
  for (;;) {
    const isRetry = writer.inFlight !== null;
    const revision = writer.acked.revision + 1;
    const save = writer.inFlight ?? {
      revision,
      source: `// writer ${writer.number}, save ${revision}\n`.repeat(100),
      key: `save-${writer.number}-${revision}`,
    };
    writer.inFlight = save;
    const answer = await send(address, writer, save);
    if (answer === null) return;
    if (answer.status !== 200 || answer.revision !== save.revision) {
      report.faults.push(
        `writer ${writer.number}: save ${save.revision} was answered ${answer.status}, revision ${String(answer.revision)}`,
      );
      return;
    }
    writer.acked = save;
    writer.inFlight = null;
    report.acknowledged++;
    if (isRetry) report.answeredAgain++;
  }
}

async function send(
  address: string,
  writer: Writer,
  save: Save,
): Promise<{ status: number; revision: unknown } | null> {
  try {
    const response = await fetch(`${address}/api/shows/${writer.showId}/draft`, {
      method: "PUT",
      headers: {
        ...SAME_ORIGIN,
        "content-type": "application/json",
        "idempotency-key": save.key,
        cookie: writer.cookie,
      },
      body: JSON.stringify({ baseRevision: save.revision - 1, source: save.source }),
    });
    const body = (await response.json()) as { revision?: unknown };
    return { status: response.status, revision: body.revision };
  } catch {
    return null;
  }
}

function findFaults(folder: string, writers: readonly Writer[]): string[] {
  const connection = openDatabase(join(folder, DATABASE_FILE));
  try {
    return [...findFileFaults(connection), ...writers.flatMap((writer) => findDraftFaults(connection, writer))];
  } finally {
    connection.close();
  }
}

function findFileFaults({ sqlite }: Connection): string[] {
  const integrity = String(sqlite.pragma("integrity_check", { simple: true }));
  const orphans = sqlite.pragma("foreign_key_check") as unknown[];
  return [
    ...(integrity === "ok" ? [] : [`integrity_check: ${integrity}`]),
    ...(orphans.length === 0 ? [] : [`${orphans.length} rows point nowhere`]),
  ];
}

function findDraftFaults({ db }: Connection, { number, showId, acked, inFlight }: Writer): string[] {
  const draft = db.select().from(drafts).where(eq(drafts.showId, showId)).get();
  const isAcked = draft?.revision === acked.revision && draft.source === acked.source;
  const isInFlight = inFlight !== null && draft?.revision === inFlight.revision && draft.source === inFlight.source;
  return isAcked || isInFlight
    ? []
    : [`writer ${number}: save ${acked.revision} was acknowledged, the file has ${String(draft?.revision)}`];
}

function delay(milliseconds: number): Promise<void> {
  return new Promise((done) => setTimeout(done, milliseconds));
}
