import { mkdtempSync, rmSync } from "node:fs";
import { tmpdir } from "node:os";
import path from "node:path";
import { chromium, type Page } from "playwright-core";
import { build } from "vite";
import { BROWSER_ARGS } from "../support/browser-args.ts";
import { ensureChromium } from "../support/chromium.ts";
import { serveFolder } from "./serve-folder.ts";
import type { Lab } from "./lab.ts";
import type { Zone } from "./page/main.ts";

const PAGE = path.resolve(import.meta.dirname, "page");

/** A page that holds the product's run worker, built by Vite into a folder of its own and served from there. */
export interface EnginePage {
  readonly address: string;
  close(): void;
}

/** Builds and serves the page. */
export async function openEnginePage(): Promise<EnginePage> {
  const folder = mkdtempSync(path.join(tmpdir(), "duskbell-engine-"));
  await build({
    configFile: false,
    root: PAGE,
    base: "./",
    logLevel: "error",
    worker: { format: "es" },
    build: { outDir: folder, emptyOutDir: true, assetsInlineLimit: 0, minify: false, chunkSizeWarningLimit: 20_000 },
  });
  const server = await serveFolder(folder);
  return {
    address: server.address,
    close: () => {
      server.close();
      rmSync(folder, { recursive: true, force: true });
    },
  };
}

/** The browser's way to run scripts: the product's client and worker, and workers for what goes straight in. */
export interface ChromiumLab extends Lab {
  askZone(): Promise<Zone>;
}

/** Opens the page in a Chromium of its own, which lives in a time zone and a locale. */
export async function openChromiumLab(
  { address }: EnginePage,
  { timeZone = "UTC", locale = "en-US" }: Partial<Zone> = {},
): Promise<ChromiumLab> {
  const browser = await chromium.launch({
    executablePath: ensureChromium(console.log),
    args: [...BROWSER_ARGS, `--lang=${locale}`],
    env: { ...process.env, TZ: timeZone },
  });
  const page: Page = await (await browser.newContext({ locale })).newPage();
  await page.goto(address);
  const run = (way: "whole" | "straight", json: string, deadlineMs: number) =>
    page.evaluate(([way, json, deadlineMs]) => window.lab[way](json, deadlineMs), [way, json, deadlineMs] as const);
  return {
    name: "Chromium",
    whole: (input, deadlineMs) => run("whole", JSON.stringify(input), deadlineMs),
    straight: (input, deadlineMs) => run("straight", JSON.stringify(input), deadlineMs),
    countWorkers: () => page.evaluate(() => window.lab.countWorkers()),
    askZone: () => page.evaluate(() => window.lab.askZone()),
    close: () => browser.close(),
  };
}
