import { mkdirSync } from "node:fs";
import { tmpdir } from "node:os";
import path from "node:path";
import { type Browser, type BrowserContext, chromium, type Page } from "playwright-core";
import { BROWSER_ARGS } from "../../support/browser-args.ts";
import { ensureChromium } from "../../support/chromium.ts";

const ARGS = [...BROWSER_ARGS, "--autoplay-policy=user-gesture-required"];

export async function launchBrowser(): Promise<Browser> {
  return chromium.launch({ executablePath: ensureChromium(console.log), args: ARGS });
}

/** One person at one computer, with everything that went wrong on its pages. */
export interface Person {
  readonly context: BrowserContext;
  readonly page: Page;
  /** Console errors, uncaught errors and requests off the origin, as sentences. Empty is good. */
  readonly faults: string[];
  close(): Promise<void>;
}

export interface PersonOptions {
  readonly width?: number;
  readonly height?: number;
  readonly colorScheme?: "light" | "dark";
  /** Console errors that the test causes on purpose. */
  readonly expectedErrors?: RegExp;
  /** What an earlier profile kept: cookies of a sign-in. Nothing by default. */
  /** Lets the page keep its files for a time without network. Off: what a test puts in place of an answer must reach the page. */
  readonly isKeptOffline?: boolean;
  readonly storageState?: Awaited<ReturnType<BrowserContext["storageState"]>> | undefined;
}

/** Opens a fresh browser profile on the product. */
export async function openPerson(browser: Browser, address: string, options: PersonOptions = {}): Promise<Person> {
  const context = await browser.newContext({
    baseURL: address,
    viewport: { width: options.width ?? 1366, height: options.height ?? 768 },
    colorScheme: options.colorScheme ?? "light",
    serviceWorkers: options.isKeptOffline ? "allow" : "block",
    ...(options.storageState && { storageState: options.storageState }),
  });
  const page = await context.newPage();
  const faults: string[] = [];
  const note = (fault: string) => {
    if (!options.expectedErrors?.test(fault)) faults.push(fault);
  };
  page.on("console", (message) => {
    if (message.type() === "error") note(`console: ${message.text()} (${message.location().url})`);
  });
  page.on("pageerror", (error) => note(`uncaught: ${error.message}`));
  context.on("request", (request) => {
    const url = new URL(request.url());
    if (url.protocol.startsWith("http") && url.origin !== address) note(`off origin: ${request.url()}`);
  });
  return { context, page, faults, close: () => context.close() };
}

/** Keeps a picture of what everybody had on screen when a journey failed, and says where. */
export async function keepPictures(people: readonly Person[], name: string): Promise<void> {
  const folder = path.join(tmpdir(), "duskbell-journeys");
  mkdirSync(folder, { recursive: true });
  for (const [i, { page, faults }] of people.entries()) {
    const file = path.join(folder, `${name.replaceAll(/[^a-z]+/g, "-")}-${i + 1}.png`);
    await page.screenshot({ path: file }).catch(() => undefined);
    console.error(`${file} shows ${page.url()}`, faults);
  }
}
