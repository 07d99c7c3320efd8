import type { Browser, Page } from "playwright-core";
import { afterAll, beforeAll, describe, expect, inject, it } from "vitest";
import { launchBrowser, openPerson, type Person } from "./support/browser.ts";
import { signInStudent, STUDENT } from "./support/sign-in.ts";

/** WCAG 2.2, success criterion 2.5.8 (target size, minimum): 24 by 24 CSS pixels. */
const LEAST_TARGET = 24;

let browser: Browser;
let wren: Person;
let page: Page;

beforeAll(async () => {
  browser = await launchBrowser();
  wren = await openPerson(browser, inject("address"), {
    // What the browser's own editing says when a text takes the place of several lines at once, as here.
    expectedErrors: /Applying inline style/,
  });
  page = wren.page;
  await signInStudent(page, STUDENT);
  await page.goto("/shows");
  await page.locator("a[href^='/shows/']:not([href='/shows/new'])").first().click();
  await page.getByText("On stage: this script").waitFor();
});
afterAll(async () => {
  await wren.close();
  await browser.close();
});

/** Replaces the script, by keys alone. */
async function write(text: string): Promise<void> {
  await page.getByRole("textbox", { name: "Script" }).focus();
  await page.keyboard.press("Control+a");
  await page.keyboard.insertText(text);
  await page.keyboard.press("Control+Enter");
}

const status = (words: RegExp) => page.getByRole("status").filter({ hasText: words }).first();

describe("the studio without a mouse and without a screen", () => {
  it("is a tree of named parts", async () => {
    const tree = await page.locator("body").ariaSnapshot();
    for (const part of [
      'region "Square and song"',
      'img "North side of the square at dusk"',
      'group "Fronts in the picture"',
      'group "Play the show"',
      'button "Play"',
      'group "Ribbon of the show"',
      'region "Script"',
      'textbox "Script"',
      'button "Run Ctrl Enter"',
      'tablist "Help for this script"',
      'tab "Check',
      'tabpanel "Check',
    ])
      expect(tree).toContain(part);
    // Nothing that can be pressed is without a name.
    expect(tree.match(/- (button|link|tab|checkbox|slider|textbox)(?! ")(:|$)/gm) ?? []).toEqual([]);
  });

  it("says by a live region what a run came to, and what is wrong", async () => {
    await write("square.all.on();\nwait(4);\nsquare.all.off();");
    await status(/^Ran: 2 cues\.$/).waitFor({ state: "attached" });
    await write("square.all.on(;");
    await status(/^Line 1: The \( in line 1 has no \)\.$/).waitFor({ state: "attached" });
    expect(await page.getByRole("note", { name: "Problem in line 1" }).innerText()).toContain("has no");
  });

  it("takes a fix, plays and stops by keys", async () => {
    await page.getByRole("textbox", { name: "Script" }).focus();
    await page.keyboard.press("Control+.");
    await status(/^Ran: 1 cue\.$/).waitFor({ state: "attached" });
    await page.keyboard.press("Escape");
    await page.keyboard.press("Tab");
    expect(await page.evaluate(() => document.activeElement?.closest(".cm-editor"))).toBeNull();
    await page.getByRole("button", { name: "Play", exact: true }).focus();
    await page.keyboard.press("Enter");
    await page.getByRole("button", { name: "Pause", exact: true }).waitFor();
    await page.keyboard.press("Enter");
    await page.getByRole("button", { name: "Play", exact: true }).waitFor();
  });

  it("reaches every control by Tab, in the order of the page, and comes round", async () => {
    await page.reload();
    await page.getByText("On stage: this script").waitFor();
    const seen: string[] = [];
    for (let press = 0; press < 80; press += 1) {
      await page.keyboard.press("Tab");
      const name = await page.evaluate(() => {
        const { activeElement: at } = document;
        // The editor keeps Tab for itself; Escape lets it through.
        return at === document.body || !at ? "" : `${at.tagName} ${at.getAttribute("aria-label") ?? at.textContent}`;
      });
      if (name === "") break;
      seen.push(name);
      if (name.startsWith("DIV Script")) await page.keyboard.press("Escape");
    }
    const order = ["BUTTON Play", "DIV Script", "BUTTON Check"].map((name) =>
      seen.findIndex((one) => one.startsWith(name)),
    );
    expect(order.every((place) => place >= 0)).toBe(true);
    expect([...order].sort((a, b) => a - b)).toEqual(order);
    for (const control of ["Loop", "How the script looks", "Lay the script out", "Run", "Hand in"])
      expect(
        seen.some((name) => name.includes(control)),
        control,
      ).toBe(true);
  });

  it.each([
    [1366, 768],
    [390, 844],
  ])("has no target below 24 pixels at %d by %d", async (width, height) => {
    await page.setViewportSize({ width, height });
    const small = await page.evaluate((least) => {
      const controls = document.querySelectorAll<HTMLElement>(
        "button, a[href], input, select, summary, [role=tab], [role=slider]",
      );
      return [...controls].flatMap((control) => {
        const { width: across, height: down } = control.getBoundingClientRect();
        // A box in a label is pressed by its label; a link in a sentence is excepted by the criterion.
        const isExcepted = control.closest("label, p, .cm-content") !== null;
        const isShown = across > 0 && down > 0 && getComputedStyle(control).visibility !== "hidden";
        return isShown && !isExcepted && (across < least || down < least)
          ? [`${control.getAttribute("aria-label") ?? control.textContent}: ${across.toFixed(0)} x ${down.toFixed(0)}`]
          : [];
      });
    }, LEAST_TARGET);
    expect(small).toEqual([]);
    await page.setViewportSize({ width: 1366, height: 768 });
  });

  it.each([
    ["one front", 'square.front("bakery").on();', 'only the front "bakery" lights up.'],
    [
      "a side in turn",
      'for (const front of square.side("east")) {\n  front.on();\n  wait(4);\n}',
      "the east side lights up one front after another.",
    ],
    ["a colour", 'square.all.on().colour("red");', "the whole square lights up all together, in red."],
    ["a fade", "square.all.fadeTo(100, 16);", "the whole square slowly grows brighter."],
    ["darkness", "wait(8);\nsquare.all.on();\nwait(8);\nsquare.all.off();", "all is dark."],
  ])("describes %s in words beside the picture", async (_, script, words) => {
    await write(script);
    await status(/^Ran: /).waitFor({ state: "attached" });
    const picture = page.getByRole("img", { name: "North side of the square at dusk" });
    const id = (await picture.getAttribute("aria-describedby")) ?? "";
    await page.waitForFunction(({ place, said }) => document.getElementById(place)?.textContent?.includes(said), {
      place: id,
      said: words,
    });
  });

  it("caused no error on its pages", () => {
    expect(wren.faults).toEqual([]);
  });
});
