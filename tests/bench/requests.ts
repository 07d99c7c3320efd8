import SqliteDatabase from "better-sqlite3";
import express from "express";
import { createServer, type RequestListener, type Server } from "node:http";
import type { AddressInfo } from "node:net";
import { mkdtempSync, rmSync } from "node:fs";
import { tmpdir } from "node:os";
import path from "node:path";
import { buildClass, buildShow, buildSquare, buildUser } from "../support/factories.ts";
import { createTestServer } from "../support/test-server.ts";
import { createTestClock } from "../support/test-clock.ts";
import { type Figure, median } from "./measure.ts";

const READS = 400;
const SAVES = 300;
const ROUNDS = 5;
const WRITERS = 10;
/** A long script of a pupil. */
const SCRIPT = "// Gold runs up the north side.\n".repeat(190);

/**
 * Reading one show and saving its draft through the whole application, against a bare Express handler
 * on the same kind of database; both over loopback, in turns.
 */
export async function benchRequests(): Promise<Figure[]> {
  const portal = createTestServer({ clock: createTestClock(Date.now()), checkResponses: false });
  buildSquare(portal.db);
  const student = buildUser(portal.db);
  buildClass(portal.db, { studentIds: [student.id] });
  const show = buildShow(portal.db, { authorIds: [student.id], source: SCRIPT });
  const cookie = await portal.signIn(student.id);
  const folder = mkdtempSync(path.join(tmpdir(), "duskbell-bench-"));
  const bare = createBareServer(path.join(folder, "bare.db"));
  const servers = [await listen(portal.app), await listen(bare.app)] as const;
  const [ours, theirs] = servers.map((server) => `http://127.0.0.1:${(server.address() as AddressInfo).port}`) as [
    string,
    string,
  ];

  let revision = 1;
  const headers = { cookie, "sec-fetch-site": "same-origin", "content-type": "application/json" };
  const save = async (): Promise<void> => {
    const body = JSON.stringify({ baseRevision: revision, source: `${SCRIPT}// ${revision}` });
    const key = `bench-save-${revision}`;
    await send(`${ours}/api/shows/${show.id}/draft`, {
      method: "PUT",
      headers: { ...headers, "idempotency-key": key },
      body,
    });
    revision += 1;
  };
  const bareSave = (): Promise<void> =>
    send(`${theirs}/draft`, {
      method: "PUT",
      headers: { "content-type": "application/json" },
      body: JSON.stringify({ source: SCRIPT }),
    });

  const reads = await inTurns(
    READS,
    () => send(`${ours}/api/shows/${show.id}`, { headers }),
    () => send(`${theirs}/show`, {}),
    WRITERS,
  );
  // Saves of one draft follow each other: each names the revision before it.
  const saves = await inTurns(SAVES, save, bareSave, 1);
  for (const server of servers) server.close();
  portal.dispose();
  bare.close();
  rmSync(folder, { recursive: true, force: true });
  return [
    {
      name: "reading a show",
      value: reads.ours,
      unit: "requests a second",
      against: "bare Express and better-sqlite3",
      ratio: reads.ours / reads.theirs,
    },
    {
      name: "saving a draft of 6 kB",
      value: saves.ours,
      unit: "saves a second",
      against: "bare Express and better-sqlite3",
      ratio: saves.ours / saves.theirs,
    },
  ];
}

async function send(url: string, init: RequestInit): Promise<void> {
  const response = await fetch(url, init);
  const text = await response.text();
  if (!response.ok) throw new Error(`${url} answered ${response.status}: ${text.slice(0, 300)}`);
}

/** Requests a second of both, in alternating rounds. */
async function inTurns(
  count: number,
  ours: () => Promise<void>,
  theirs: () => Promise<void>,
  atOnce: number,
): Promise<{ ours: number; theirs: number }> {
  const rates = { ours: new Array<number>(), theirs: new Array<number>() };
  for (let round = 0; round < ROUNDS; round += 1) {
    rates.ours.push(await rate(count, ours, atOnce));
    rates.theirs.push(await rate(count, theirs, atOnce));
  }
  return { ours: median(rates.ours), theirs: median(rates.theirs) };
}

async function rate(count: number, call: () => Promise<void>, atOnce: number): Promise<number> {
  let left = count;
  const start = performance.now();
  await Promise.all(
    Array.from({ length: atOnce }, async () => {
      while (left > 0) {
        left -= 1;
        await call();
      }
    }),
  );
  return count / ((performance.now() - start) / 1000);
}

function listen(app: RequestListener): Promise<Server> {
  const server = createServer(app);
  return new Promise((resolve) => server.listen(0, "127.0.0.1", () => resolve(server)));
}

/** The least that could answer the same two requests: no session, no validation, no history. */
function createBareServer(file: string): { app: RequestListener; close(): void } {
  const database = new SqliteDatabase(file);
  database.pragma("journal_mode = wal");
  database.pragma("synchronous = 2");
  database.exec("create table drafts (id integer primary key, revision integer, source text, saved_at integer)");
  database.prepare("insert into drafts values (1, 1, ?, 0)").run(SCRIPT);
  const read = database.prepare("select * from drafts where id = 1");
  const write = database.prepare("update drafts set source = ?, revision = revision + 1, saved_at = ? where id = 1");
  const app = express();
  app.use(express.json({ limit: "1mb" }));
  app.get("/show", (_req, res) => void res.json(read.get()));
  app.put("/draft", (req, res) => {
    const { source } = req.body as { source: string };
    write.run(source, Date.now());
    res.json({ isSaved: true });
  });
  return { app, close: () => void database.close() };
}
