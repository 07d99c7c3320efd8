import { type ChildProcess, spawn } from "node:child_process";
import { mkdtempSync, rmSync } from "node:fs";
import { createServer } from "node:net";
import { tmpdir } from "node:os";
import path from "node:path";

const ROOT = path.resolve(import.meta.dirname, "../../..");
const START_LIMIT_MS = 180_000;
const POLL_MS = 250;

/** The product as `npm start` runs it, on a data folder of its own. */
export interface Product {
  readonly address: string;
  readonly dataDir: string;
  /** All that the server printed. */
  output(): string;
  stop(): Promise<void>;
}

async function freePort(): Promise<number> {
  return new Promise((resolve, reject) => {
    const server = createServer();
    server.once("error", reject);
    server.listen(0, "127.0.0.1", () => {
      const address = server.address();
      const port = typeof address === "object" && address !== null ? address.port : 0;
      server.close(() => resolve(port));
    });
  });
}

/** Starts the built product with the demo world and waits until it is ready. Rejects with its output when it stops first. */
export async function startProduct(options: { dataDir?: string; port?: number } = {}): Promise<Product> {
  const port = options.port ?? (await freePort());
  const dataDir = options.dataDir ?? mkdtempSync(path.join(tmpdir(), "duskbell-journey-"));
  const child = spawn(process.execPath, ["--import", "tsx", "server/main.ts"], {
    cwd: ROOT,
    env: {
      ...process.env,
      PORT: String(port),
      HOST: "127.0.0.1",
      DATA_DIR: dataDir,
      LOG_LEVEL: "warn",
      NODE_ENV: "production",
    },
    stdio: ["ignore", "pipe", "pipe"],
  });
  let printed = "";
  child.stdout.on("data", (chunk: Buffer) => (printed += chunk.toString()));
  child.stderr.on("data", (chunk: Buffer) => (printed += chunk.toString()));
  const address = `http://127.0.0.1:${port}`;
  await waitUntilReady(child, address, () => printed);
  return {
    address,
    dataDir,
    output: () => printed,
    async stop() {
      await endProcess(child);
      if (options.dataDir === undefined) rmSync(dataDir, { recursive: true, force: true });
    },
  };
}

async function waitUntilReady(child: ChildProcess, address: string, output: () => string): Promise<void> {
  const end = Date.now() + START_LIMIT_MS;
  while (Date.now() < end) {
    if (child.exitCode !== null) throw new Error(`The server stopped with code ${child.exitCode}:\n${output()}`);
    const isReady = await fetch(`${address}/readyz`).then(
      (response) => response.ok,
      () => false,
    );
    if (isReady) return;
    await new Promise((resolve) => setTimeout(resolve, POLL_MS));
  }
  child.kill("SIGKILL");
  throw new Error(`The server was not ready after ${START_LIMIT_MS / 1000} s:\n${output()}`);
}

async function endProcess(child: ChildProcess): Promise<void> {
  if (child.exitCode !== null) return;
  await new Promise<void>((resolve) => {
    child.once("exit", () => resolve());
    child.kill("SIGTERM");
  });
}
