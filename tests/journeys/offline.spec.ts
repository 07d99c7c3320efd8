import type { Browser } from "playwright-core";
import { afterAll, beforeAll, describe, expect, inject, it } from "vitest";
import { launchBrowser, openPerson, type Person } from "./support/browser.ts";
import { signInStudent, STUDENT } from "./support/sign-in.ts";

const address = inject("address");
const LINE = "// written without a network";

let browser: Browser;
let wren: Person;
beforeAll(async () => {
  browser = await launchBrowser();
  wren = await openPerson(browser, address, {
    isKeptOffline: true,
    // What a page says of the network that the test cuts.
    expectedErrors: /ERR_INTERNET_DISCONNECTED|Failed to load resource/,
  });
});
afterAll(async () => {
  await wren.close();
  await browser.close();
});

/** Waits until every file that the service worker keeps is there. */
async function waitUntilKept({ page }: Person): Promise<void> {
  await page.evaluate(async () => {
    await navigator.serviceWorker.ready;
  });
}

const readScript = ({ page }: Person) => page.locator(".cm-content").first().innerText();
const saveState = ({ page }: Person) => page.locator(".studio-save-button");

describe("a lesson without a network", () => {
  it("opens the studio, runs, sounds and keeps what is written, and saves it when the network is back", async () => {
    const { page, context } = wren;
    await signInStudent(page, STUDENT);
    await page.goto("/shows");
    await page.locator("a[href^='/shows/']:not([href='/shows/new'])").first().click();
    await page.locator(".glow-bead").nth(1).waitFor();
    await waitUntilKept(wren);

    await context.setOffline(true);
    await page.reload();
    await page.locator(".glow-bead").nth(1).waitFor();
    await page.locator(".cm-content").first().click();
    await page.keyboard.press("Control+Home");
    await page.keyboard.type(`${LINE}\n`);
    await saveState(wren).filter({ hasText: "Kept on this computer" }).waitFor();

    await page.reload();
    await page.locator(".glow-bead").nth(1).waitFor();
    expect(await readScript(wren)).toContain(LINE);
    await page.getByRole("button", { name: "Play", exact: true }).click();
    await page.getByRole("button", { name: "Pause", exact: true }).waitFor();
    await page.keyboard.press("Escape");
    await page.getByRole("button", { name: "Play", exact: true }).waitFor();

    await context.setOffline(false);
    await saveState(wren).filter({ hasText: "Saved" }).waitFor();
    const showId = new URL(page.url()).pathname.split("/").at(-1);
    const answer = await page.request.get(`/api/shows/${showId}`, { headers: { "sec-fetch-site": "same-origin" } });
    const { draft } = (await answer.json()) as { draft: { source: string } };
    expect(draft.source).toContain(LINE);
    expect(wren.faults).toEqual([]);
  });

  it("leaves nothing of a person for the next one at the same computer", async () => {
    const { page, context } = wren;
    const showUrl = page.url();
    await page.goto("/home");
    await page.getByRole("button", { name: "Wren" }).first().click();
    await page
      .getByRole("menuitem", { name: "Sign out", exact: true })
      .or(page.getByRole("button", { name: "Sign out", exact: true }))
      .click();
    await page.waitForURL("**/sign-in");
    await context.setOffline(true);
    await page.goto(showUrl);
    await page
      .getByText(/can ?not be reached|does not answer/)
      .first()
      .waitFor();
    expect(await page.locator(".studio").count()).toBe(0);
    await context.setOffline(false);
  });
});
