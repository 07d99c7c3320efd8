import { gzipSync } from "node:zlib";
import type { Browser } from "playwright-core";
import { ensureClientBuild } from "../../server/cli/client-build.ts";
import { launchBrowser } from "../journeys/support/browser.ts";
import { PAGES, type PageCheck } from "../journeys/support/pages.ts";
import { startProduct } from "../journeys/support/product.ts";
import { signInAs } from "../journeys/support/sign-in.ts";
import type { Figure } from "./measure.ts";

const KIB = 1024;
/** Aim for the scripts and styles of a first visit. */
const CODE_LIMIT_KIB = 200;
/** Time for what a page loads after it stands: workers, the song. */
const QUIET_MS = 1500;
/** Typefaces and programs for the engine are packed already. */
const PACKED = /\.(woff2|wasm)$/;

interface Weight {
  readonly code: number;
  readonly all: number;
}

/**
 * What the first visit of each page loads, in bytes as gzip would send them: scripts and styles
 * against the aim, and everything (typefaces, workers, the engine, data) on its own.
 */
export async function benchPages(): Promise<Figure[]> {
  await ensureClientBuild(console.log);
  const product = await startProduct();
  const browser = await launchBrowser();
  const figures: Figure[] = [];
  try {
    for (const [route, check] of Object.entries(PAGES)) {
      const { code, all } = await weigh(browser, product.address, check);
      figures.push(
        {
          name: `scripts and styles of ${route}`,
          value: code / KIB,
          unit: "KiB gzip",
          against: `the aim of ${CODE_LIMIT_KIB} KiB`,
          ratio: code / KIB / CODE_LIMIT_KIB,
        },
        { name: `everything loaded by ${route}`, value: all / KIB, unit: "KiB", against: null, ratio: null },
      );
    }
  } finally {
    await browser.close();
    await product.stop();
  }
  return figures;
}

/** Opens the page in a fresh profile that has only a sign-in, nothing in its cache. */
async function weigh(browser: Browser, address: string, check: PageCheck): Promise<Weight> {
  const before = await browser.newContext({ baseURL: address });
  const entrance = await before.newPage();
  await signInAs(entrance, check.as);
  const open = typeof check.open === "string" ? check.open : await check.open(entrance);
  const storageState = await before.storageState();
  await before.close();

  const context = await browser.newContext({ baseURL: address, storageState });
  const page = await context.newPage();
  const sizes = new Map<string, Promise<Weight>>();
  context.on("response", (response) => {
    const { pathname } = new URL(response.url());
    if (sizes.has(pathname) || response.status() !== 200) return;
    const weight = response.body().then(
      (body): Weight => {
        const all = PACKED.test(pathname) ? body.length : gzipSync(body).length;
        const isWorker = response.request().resourceType() !== "script" && pathname.endsWith(".js");
        const isCode = /\.(js|css)$/.test(pathname) && !isWorker;
        return { code: isCode ? all : 0, all };
      },
      () => ({ code: 0, all: 0 }),
    );
    sizes.set(pathname, weight);
  });
  await page.goto(open, { waitUntil: "networkidle" });
  await page.waitForTimeout(QUIET_MS);
  const weights = await Promise.all(sizes.values());
  await context.close();
  return {
    code: weights.reduce((sum, weight) => sum + weight.code, 0),
    all: weights.reduce((sum, weight) => sum + weight.all, 0),
  };
}
