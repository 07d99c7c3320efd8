import { readdirSync, readFileSync } from "node:fs";
import path from "node:path";
import { gzipSync } from "node:zlib";
import { ensureClientBuild } from "../../server/cli/client-build.ts";
import { launchBrowser } from "../journeys/support/browser.ts";
import { startProduct } from "../journeys/support/product.ts";
import { signInStudent } from "../journeys/support/sign-in.ts";
import type { Figure } from "./measure.ts";

const CLIENT = path.resolve(import.meta.dirname, "../../dist/client");
const KIB = 1024;
const LIMIT_KIB = 200;

/** Pages anybody reaches, then those of a student. */
const PUBLIC = ["/programme", "/sign-in"];
const STUDENT = ["/home", "/shows", "/lessons"];

/** What a first visit of each page loads, as gzip would send it: scripts, styles, fonts and data. */
export async function benchPages(): Promise<Figure[]> {
  await ensureClientBuild(console.log);
  const product = await startProduct();
  const browser = await launchBrowser();
  const figures: Figure[] = [];
  try {
    for (const route of [...PUBLIC, ...STUDENT]) {
      const context = await browser.newContext({ baseURL: product.address });
      const page = await context.newPage();
      if (STUDENT.includes(route)) await signInStudent(page);
      const scripts = new Set<string>();
      page.on("response", (response) => {
        const { pathname } = new URL(response.url());
        if (pathname.endsWith(".js") || pathname.endsWith(".css")) scripts.add(pathname);
      });
      await page.goto(route, { waitUntil: "networkidle" });
      const bytes = [...scripts].reduce((sum, name) => sum + gzipSync(readFileSync(path.join(CLIENT, name))).length, 0);
      figures.push({
        name: `scripts and styles of ${route}`,
        value: bytes / KIB,
        unit: "KiB gzip",
        against: `the aim of ${LIMIT_KIB} KiB`,
        ratio: bytes / KIB / LIMIT_KIB,
      });
      await context.close();
    }
  } finally {
    await browser.close();
    await product.stop();
  }
  const total = readdirSync(path.join(CLIENT, "assets")).reduce(
    (sum, name) => sum + readFileSync(path.join(CLIENT, "assets", name)).length,
    0,
  );
  figures.push({ name: "everything built", value: total / KIB, unit: "KiB", against: null, ratio: null });
  return figures;
}
