import { fileURLToPath } from "node:url";
import type { Browser, BrowserContext, CDPSession, Page } from "playwright-core";
import { rolldown } from "rolldown";
import { LARGE_SQUARE } from "../../server/db/seed/world/square.ts";
import { ensureClientBuild } from "../../server/cli/client-build.ts";
import { listLights } from "../../sandbox/square/lights.ts";
import type { Layout } from "../../shared/contracts/square.ts";
import { launchBrowser } from "../journeys/support/browser.ts";
import { startProduct } from "../journeys/support/product.ts";
import { signInStudent } from "../journeys/support/sign-in.ts";
import { type Figure, median, percentile } from "./measure.ts";
import type { StagePage } from "./stage-page.ts";
import type { Noted } from "./studio-probe.ts";

/** A school laptop is about four times as slow as this machine (common practice, no source). Throttling does not reach workers: their time is multiplied. */
const SLOWNESS = 4;
/** "Slow 4G" as browsers' own tools have it: 1.6 Mbit/s down, 750 kbit/s up, 150 ms (from memory). */
const SLOW_4G = { downloadThroughput: 1_600_000 / 8, uploadThroughput: 750_000 / 8, latency: 150, offline: false };
/** A machine with other work may take long; what is measured does not depend on it. */
const PATIENCE_MS = 180_000;
const KEYSTROKES = 25;
const SCRIPT_LINES = 150;
const MANY_LIGHTS = 5000;
const INJECTED_SECONDS = 600;
const PLAYED_SECONDS = 8;

const aim = (name: string, value: number, unit: string, limit: number, of: string): Figure => ({
  name,
  value,
  unit,
  against: of,
  ratio: value / limit,
});

const plain = (name: string, value: number, unit: string): Figure => ({
  name,
  value,
  unit,
  against: null,
  ratio: null,
});

const ofIt = (part: string, times: readonly number[]): Figure => plain(`of it ${part}, median`, median(times), "ms");

/** How quickly the studio answers: to a keystroke, in every frame, with many lights, over a long time, on a slow line. */
export async function benchStudio(): Promise<Figure[]> {
  // BENCH_ADDRESS names a running product instead, for work on the bench itself.
  const running = process.env["BENCH_ADDRESS"];
  if (running === undefined) await ensureClientBuild(console.log);
  const product = running === undefined ? await startProduct() : { address: running, stop: () => Promise.resolve() };
  const browser = await launchBrowser();
  try {
    return [
      ...(await benchKeystrokes(browser, product.address)),
      ...(await benchPlayback(browser, product.address)),
      ...(await benchVisits(browser, product.address)),
      ...(await benchPicture(browser)),
    ];
  } finally {
    await browser.close();
    await product.stop();
  }
}

/** The id of the signed-in student's first show. */
async function findFirstShow(page: Page): Promise<string> {
  const answer = await page.request.get("/api/shows", { headers: { "sec-fetch-site": "same-origin" } });
  const { shows } = (await answer.json()) as { shows: { id: string }[] };
  const [show] = shows;
  if (!show) throw new Error("The demo student has no show.");
  return show.id;
}

/** A file of this folder as one script for a page. (A function passed to a page would not do: tsx puts helpers of its own into it.) */
async function bundleForPage(file: string): Promise<string> {
  const input = fileURLToPath(new URL(file, import.meta.url));
  const build = await rolldown({ input, logLevel: "silent", platform: "browser" });
  const { output } = await build.generate({ format: "iife" });
  await build.close();
  return output[0].code;
}

/** A show that lights up on every line: 150 lines, the first of which is typed into. */
function longScript(): string {
  const lines = Array.from({ length: SCRIPT_LINES - 3 }, (_, i) =>
    i % 3 === 2
      ? "wait(1);"
      : `square.side("${["north", "east", "south", "west"][i % 4] ?? "north"}").pulse(${1 + (i % 4)});`,
  );
  return [`square.all.on(5);`, ...lines, "square.all.off();", 'square.front("bakery").on(5);'].join("\n");
}

interface OpenStudio {
  readonly context: BrowserContext;
  readonly page: Page;
  readonly cdp: CDPSession;
}

/** The studio with the long script and the large square in it. */
async function openStudio(browser: Browser, address: string): Promise<OpenStudio> {
  const context = await browser.newContext({
    baseURL: address,
    viewport: { width: 1366, height: 768 },
    serviceWorkers: "block",
  });
  context.setDefaultTimeout(PATIENCE_MS);
  await context.addInitScript({ content: await bundleForPage("./studio-probe.ts") });
  const page = await context.newPage();
  await signInStudent(page);
  await page.route("**/api/square/layouts/*", async (route) => {
    const answer = (await (await route.fetch()).json()) as object;
    await route.fulfill({ json: { ...answer, layout: LARGE_SQUARE } });
  });
  await page.route(/\.worker-[^/]*\.js$/, async (route) => {
    const answer = await route.fetch();
    await route.fulfill({ response: answer, body: `${NOTE_SPANS}${await answer.text()}` });
  });
  const showId = await findFirstShow(page);
  const headers = { "sec-fetch-site": "same-origin", origin: address };
  const { draft } = (await (await page.request.get(`/api/shows/${showId}`, { headers })).json()) as {
    draft: { revision: number };
  };
  const saved = await page.request.put(`/api/shows/${showId}/draft`, {
    headers: { ...headers, "idempotency-key": crypto.randomUUID() },
    data: { baseRevision: draft.revision, source: longScript() },
  });
  if (!saved.ok()) throw new Error(`The script of the bench was not saved: ${saved.status()}.`);
  await page.goto(`/shows/${showId}`);
  // On a machine with much other work the wall clock may end the first run: it is asked for again.
  const onStage = page.getByText("On stage: this script");
  await onStage.or(page.getByText("Nothing on stage yet")).waitFor();
  if (!(await onStage.isVisible())) await page.getByRole("button", { name: /^Run/ }).click();
  await onStage.waitFor();
  await page.locator(".cm-content").click();
  return { context, page, cdp: await context.newCDPSession(page) };
}

const readNoted = (page: Page) => page.evaluate(() => (window as unknown as { noted: Noted }).noted);

/** A piece of work of a worker: what it was asked, when (milliseconds since 1970) and for how long. */
interface Span {
  readonly called: string;
  readonly at: number;
  readonly ms: number;
}

/**
 * Notes the work of a worker, from a message to its answer. Put before its own script, so that it is the
 * first to hear. A text: tsx would put helpers into a function.
 */
const NOTE_SPANS = `
  self.spans = [];
  let called = "", start = 0;
  addEventListener("message", ({ data }) => {
    called = data.path?.[0] ?? data.kind;
    start = performance.now();
  });
  const post = self.postMessage;
  self.postMessage = (...all) => {
    post.apply(self, all);
    self.spans.push({ called, at: performance.timeOrigin + start, ms: performance.now() - start });
  };
`;

async function readSpans(page: Page): Promise<Span[]> {
  const all = await Promise.all(
    page.workers().map((worker) => worker.evaluate<Span[]>("self.spans?.splice(0) ?? []").catch(() => [])),
  );
  return all.flat();
}

/** From a keystroke in a long script to the light that it changes, without the pause after typing. */
async function benchKeystrokes(browser: Browser, address: string): Promise<Figure[]> {
  const { context, page, cdp } = await openStudio(browser, address);
  // The flash check of the first run is behind us, so that its worker does not take the time of the next.
  await page.waitForTimeout(4000);
  await page.keyboard.press("Control+Home");
  await page.keyboard.press("End");
  await page.keyboard.press("ArrowLeft");
  await page.keyboard.press("ArrowLeft");
  await cdp.send("Emulation.setCPUThrottlingRate", { rate: SLOWNESS });
  const parts = { typing: [] as number[], page: [] as number[], run: [] as number[], picture: [] as number[] };
  const totals: number[] = [];
  const waits: number[] = [];
  for (let stroke = 0; stroke < KEYSTROKES; stroke += 1) {
    await page.keyboard.press("Backspace");
    await page.keyboard.press(String(1 + ((stroke * 4 + 2) % 9)));
    const { key } = await readNoted(page);
    await page.waitForFunction((since) => {
      const { asked, painted } = (window as unknown as { noted: Noted }).noted;
      return asked > since && painted > 0;
    }, key);
    const noted = await readNoted(page);
    const spans = await readSpans(page);
    const sentAt = noted.origin + noted.sent;
    const run = sum(spans.filter(({ called }) => ["prepare", "execute", "finish"].includes(called)));
    const picture = sum(spans.filter(({ called, at }) => called === "draw" && at >= sentAt - 1).slice(0, 1));
    const onPage = noted.sent - noted.asked - run;
    parts.typing.push(noted.keyMs);
    parts.page.push(onPage);
    parts.run.push(run);
    parts.picture.push(picture);
    waits.push(noted.asked - noted.key);
    totals.push(noted.keyMs + onPage + (run + picture) * SLOWNESS);
    await page.waitForTimeout(700);
  }
  await context.close();
  return [
    aim("keystroke to painted light, p95", percentile(totals, 0.95), "ms", 150, "the aim of 150 ms"),
    plain("keystroke to painted light, median", median(totals), "ms"),
    ofIt("the page while typing, slowed down", parts.typing),
    ofIt("the page between its workers, slowed down", parts.page),
    ofIt("the run in its workers, as measured", parts.run),
    ofIt("the picture in its worker, as measured", parts.picture),
    plain("wait after typing, median (apart)", median(waits), "ms"),
  ];
}

const sum = (spans: readonly Span[]): number => spans.reduce((all, { ms }) => all + ms, 0);

/** Script of the page in each frame while a show plays on 419 lights. */
async function benchPlayback(browser: Browser, address: string): Promise<Figure[]> {
  const { context, page } = await openStudio(browser, address);
  await page.waitForTimeout(4000);
  await page.getByRole("button", { name: "Play", exact: true }).click();
  await page.getByRole("button", { name: "Pause", exact: true }).waitFor();
  await page.waitForTimeout(3000);
  await page.evaluate(() => Object.assign((window as unknown as { noted: Noted }).noted, { frames: [], pictures: 0 }));
  await page.waitForTimeout(PLAYED_SECONDS * 1000);
  const { frames, pictures } = await readNoted(page);
  await context.close();
  return [
    aim("script a frame while playing, p95", percentile(frames, 0.95), "ms", 2, "the aim of 2 ms"),
    plain("script a frame while playing, median", median(frames), "ms"),
    plain("frames a second while playing", frames.length / PLAYED_SECONDS, "frames/s"),
    plain("pictures a second while playing (no GPU)", pictures / PLAYED_SECONDS, "pictures/s"),
  ];
}

/** First and second visit of the studio on a slow laptop and a slow line. */
async function benchVisits(browser: Browser, address: string): Promise<Figure[]> {
  const context = await browser.newContext({ baseURL: address, viewport: { width: 1366, height: 768 } });
  const page = await context.newPage();
  await signInStudent(page);
  const showId = await findFirstShow(page);
  const state = await context.storageState();
  await context.close();

  const fresh = await browser.newContext({
    baseURL: address,
    viewport: { width: 1366, height: 768 },
    storageState: state,
  });
  fresh.setDefaultTimeout(PATIENCE_MS);
  const visitor = await fresh.newPage();
  const cdp = await fresh.newCDPSession(visitor);
  await cdp.send("Network.enable");
  await cdp.send("Network.emulateNetworkConditions", SLOW_4G);
  await cdp.send("Emulation.setCPUThrottlingRate", { rate: SLOWNESS });
  const visit = async () => {
    const start = performance.now();
    await visitor.goto(`/shows/${showId}`, { waitUntil: "commit" });
    await visitor.locator(".cm-content").waitFor();
    const editor = performance.now() - start;
    await visitor.getByRole("button", { name: "Play", exact: true }).click();
    await visitor.getByRole("button", { name: "Pause", exact: true }).waitFor();
    return { editor: editor / 1000, play: (performance.now() - start) / 1000 };
  };
  const first = await visit();
  await visitor.goto("about:blank");
  const second = await visit();
  await fresh.close();
  return [
    aim("first visit: editor usable, 4x and slow 4G", first.editor, "s", 5, "the aim of 5 s"),
    aim("first visit: play, 4x and slow 4G", first.play, "s", 7, "the aim of 7 s"),
    aim("second visit: editor usable, 4x and slow 4G", second.editor, "s", 2, "the aim of 2 s"),
  ];
}

/** A square of so many lights: the strips of the large one, longer. */
function growSquare(lights: number): Layout {
  const strips = LARGE_SQUARE.fronts
    .flatMap((front) => front.boxes.flatMap((box) => box.outlets))
    .filter((outlet) => outlet.pixels);
  const single = listLights(LARGE_SQUARE).length - strips.reduce((sum, outlet) => sum + (outlet.pixels ?? 0), 0);
  const pixels = Math.round((lights - single) / strips.length);
  return {
    ...LARGE_SQUARE,
    fronts: LARGE_SQUARE.fronts.map((front) => ({
      ...front,
      boxes: front.boxes.map((box) => ({
        ...box,
        outlets: box.outlets.map((outlet) => (outlet.pixels ? { ...outlet, pixels } : outlet)),
      })),
    })),
  };
}

/** The picture alone: how its cost grows with the lights, and whether it keeps what it should let go of. */
async function benchPicture(browser: Browser): Promise<Figure[]> {
  const context = await browser.newContext({ viewport: { width: 1024, height: 768 } });
  const page = await context.newPage();
  await page.addScriptTag({ content: await bundleForPage("./stage-page.ts") });
  const timeFrames = (layout: Layout) =>
    page.evaluate(
      ({ wanted, frames }) => (window as unknown as { stagePage: StagePage }).stagePage.timeFrames(wanted, frames),
      { wanted: layout, frames: 240 },
    );
  const few = await timeFrames(LARGE_SQUARE);
  const many = await timeFrames(growSquare(MANY_LIGHTS));
  const growth = median(many) / median(few);
  const lights = MANY_LIGHTS / listLights(LARGE_SQUARE).length;

  const cdp = await context.newCDPSession(page);
  const readHeap = async () => {
    await cdp.send("HeapProfiler.collectGarbage");
    const { usedSize } = await cdp.send("Runtime.getHeapUsage");
    return usedSize / 1e6;
  };
  const play = (seconds: number) =>
    page.evaluate(
      ({ layout, length }) => (window as unknown as { stagePage: StagePage }).stagePage.play(layout, length),
      { layout: LARGE_SQUARE, length: seconds },
    );
  await play(INJECTED_SECONDS / 10);
  const early = await readHeap();
  await play(INJECTED_SECONDS);
  const late = await readHeap();
  await context.close();
  return [
    plain("picture of 419 lights, a frame in its worker, median", median(few), "ms"),
    aim(
      `growth of it to ${MANY_LIGHTS} lights`,
      growth,
      "times",
      lights,
      `the growth of the lights, ${lights.toFixed(1)}`,
    ),
    aim("memory after 10 minutes of fading colours", late, "MB", early, "after the first minute"),
  ];
}
