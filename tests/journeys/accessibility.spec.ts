import axe from "axe-core";
import type { Browser, BrowserContext, Page } from "playwright-core";
import { afterAll, beforeAll, describe, expect, inject, it } from "vitest";
import { flattenRoutes } from "./support/flatten-routes.ts";
import { launchBrowser, openPerson, type Person } from "./support/browser.ts";
import { type PageCheck, PAGES } from "./support/pages.ts";
import { signInAs, type Visitor } from "./support/sign-in.ts";

/** Rules of WCAG 2.0, 2.1 and 2.2, levels A and AA, as axe-core (the outside reference) reads them. */
const TAGS = ["wcag2a", "wcag2aa", "wcag21a", "wcag21aa", "wcag22aa"];
const THEMES = ["light", "dark"] as const;

type StorageState = Awaited<ReturnType<BrowserContext["storageState"]>>;

const address = inject("address");
/** What the browser of each signed-in person keeps: one sign-in by the form serves all pages. */
const kept = new Map<Visitor, StorageState>();
let browser: Browser;

beforeAll(async () => {
  browser = await launchBrowser();
  for (const visitor of new Set(Object.values(PAGES).map((check) => check.as))) {
    const person = await openPerson(browser, address);
    await signInAs(person.page, visitor);
    kept.set(visitor, await person.context.storageState());
    await person.close();
  }
});
afterAll(() => browser.close());

async function openAs(as: Visitor): Promise<Person> {
  return openPerson(browser, address, {
    width: 1280,
    height: 800,
    expectedErrors: /500|Failed to load resource/,
    storageState: kept.get(as),
  });
}

/** Waits until the page has its heading and nothing says that it loads. */
async function settle(page: Page): Promise<void> {
  await page.locator("h1").first().waitFor({ state: "attached" });
  await page.waitForLoadState("networkidle");
  await page.waitForTimeout(300);
}

async function listViolations(page: Page): Promise<string[]> {
  // Injected by the driver, not by the page: the content policy stays as it is.
  await page.evaluate(axe.source);
  const found: string[] = [];
  for (const theme of THEMES) {
    // The pages follow the system's theme by themselves; what is on them stays as it is.
    await page.emulateMedia({ colorScheme: theme });
    const results = await page.evaluate(
      (tags) =>
        (window as unknown as { axe: typeof axe }).axe.run({
          runOnly: { type: "tag", values: tags },
          resultTypes: ["violations"],
        }),
      TAGS,
    );
    for (const { id, nodes } of results.violations) {
      found.push(`${theme}: ${id}: ${nodes.map((node) => node.target.join(" ")).join(" | ")}`);
    }
  }
  return found;
}

async function visit({ page }: Person, check: PageCheck): Promise<void> {
  await page.goto(typeof check.open === "string" ? check.open : await check.open(page));
  await settle(page);
}

describe("every page of the route table, light and dark", () => {
  const paths = flattenRoutes();

  it("has an entry in the table of page checks, and no entry is without a page", () => {
    expect(Object.keys(PAGES).sort()).toEqual([...paths].sort());
  });

  for (const [path, check] of Object.entries(PAGES)) {
    it.concurrent(`${path} passes as it is, empty, failed, and with something open over it`, async () => {
      const person = await openAs(check.as);
      const { page } = person;
      try {
        await visit(person, check);
        expect(await listViolations(page), "as it is").toEqual([]);
        if (typeof check.dialog === "function") {
          await check.dialog(page);
          await page.waitForTimeout(300);
          expect(await listViolations(page), "with something open").toEqual([]);
        }
        if (!("none" in check.empty)) {
          for (const fake of check.empty) {
            await page.route(`**${fake.url}`, (route) =>
              route.fulfill({ status: fake.status ?? 200, json: fake.body }),
            );
          }
          await visit(person, check);
          expect(await listViolations(page), "empty").toEqual([]);
          await page.unrouteAll();
        }
        if (typeof check.error === "string") {
          await page.route(`**${check.error}`, (route) =>
            route.fulfill({
              status: 500,
              contentType: "application/problem+json",
              json: {
                type: "/problems/internal",
                title: "Something broke on our side.",
                status: 500,
                instance: "test-request",
              },
            }),
          );
          await visit(person, check);
          expect(await listViolations(page), "failed").toEqual([]);
        }
        expect(person.faults).toEqual([]);
      } finally {
        await person.close();
      }
    });
  }
});
