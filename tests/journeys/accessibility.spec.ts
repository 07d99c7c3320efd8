import axe from "axe-core";
import type { Browser, Page } from "playwright-core";
import { afterAll, beforeAll, describe, expect, inject, it } from "vitest";
import { flattenRoutes } from "./support/flatten-routes.ts";
import { launchBrowser, openPerson, type Person } from "./support/browser.ts";
import { type PageCheck, PAGES } from "./support/pages.ts";
import { ADMIN, COORDINATOR, signInStaff, signInStudent, TEACHER } from "./support/sign-in.ts";

/** Rules of WCAG 2.0, 2.1 and 2.2, levels A and AA, as axe-core (the outside reference) reads them. */
const TAGS = ["wcag2a", "wcag2aa", "wcag21a", "wcag21aa", "wcag22aa"];
const THEMES = ["light", "dark"] as const;

const address = inject("address");
let browser: Browser;

beforeAll(async () => {
  browser = await launchBrowser();
});
afterAll(() => browser.close());

async function signIn(page: Page, as: PageCheck["as"]): Promise<void> {
  if (as === "student") await signInStudent(page);
  if (as === "teacher") await signInStaff(page, TEACHER);
  if (as === "coordinator") await signInStaff(page, COORDINATOR);
  if (as === "admin") await signInStaff(page, ADMIN);
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
  const results = await page.evaluate(
    (tags) => (window as unknown as { axe: typeof axe }).axe.run({ runOnly: { type: "tag", values: tags } }),
    TAGS,
  );
  return results.violations.map(
    (violation) => `${violation.id}: ${violation.nodes.map((node) => node.target.join(" ")).join(" | ")}`,
  );
}

async function visit(person: Person, check: PageCheck): Promise<void> {
  await person.page.goto(typeof check.open === "string" ? check.open : await check.open(person.page));
  await settle(person.page);
}

describe("every page of the route table", () => {
  const paths = flattenRoutes();

  it("has an entry in the table of page checks, and no entry is without a page", () => {
    expect(Object.keys(PAGES).sort()).toEqual([...paths].sort());
  });

  for (const theme of THEMES) {
    describe(`in the ${theme} theme`, () => {
      for (const [path, check] of Object.entries(PAGES)) {
        it(`${path} passes as it is, empty, failed, and with something open over it`, async () => {
          const person = await openPerson(browser, address, {
            colorScheme: theme,
            width: 1280,
            height: 800,
            expectedErrors: /500|Failed to load resource/,
          });
          try {
            await signIn(person.page, check.as);
            await visit(person, check);
            expect(await listViolations(person.page), "as it is").toEqual([]);
            if (typeof check.dialog === "function") {
              await check.dialog(person.page);
              await person.page.waitForTimeout(300);
              expect(await listViolations(person.page), "with something open").toEqual([]);
            }
            if (!("none" in check.empty)) {
              for (const fake of check.empty) {
                await person.page.route(`**${fake.url}`, (route) =>
                  route.fulfill({ status: fake.status ?? 200, json: fake.body }),
                );
              }
              await visit(person, check);
              expect(await listViolations(person.page), "empty").toEqual([]);
              await person.page.unrouteAll();
            }
            if (typeof check.error === "string") {
              await person.page.route(`**${check.error}`, (route) =>
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
              expect(await listViolations(person.page), "failed").toEqual([]);
            }
            expect(person.faults).toEqual([]);
          } finally {
            await person.close();
          }
        });
      }
    });
  }
});
