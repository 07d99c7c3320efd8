import type { Browser, Page } from "playwright-core";
import { afterAll, beforeAll, describe, expect, inject, it } from "vitest";
import { demoStudent } from "../../server/db/seed/world/people.ts";
import { keepPictures, launchBrowser, openPerson, type Person } from "./support/browser.ts";
import { type Hands, KEYBOARD, MOUSE } from "./support/hands.ts";
import { COORDINATOR, signInStaff, signInStudent, TEACHER } from "./support/sign-in.ts";
import { listenFor, tapSound } from "./support/sound.ts";

const address = inject("address");
let browser: Browser;

beforeAll(async () => {
  browser = await launchBrowser();
});
afterAll(() => browser.close());

/** A loop, a function with a parameter and a list: what the assignment asks for. Every line ends in `;` or `}`. */
const SCRIPT = [
  "// The north side wakes up, then everything turns gold.",
  'const north = square.side("north");',
  "function wake(lights, level) { lights.on(level); }",
  "wake(north, 90);",
  "wait(4);",
  'const colours = ["gold", "skyblue"];',
  'for (const bar of song.section("chorus").bars) { at(bar, () => square.all.colour(colours[0]).fadeTo(60, 2)); }',
].join("\n");
const DARK = "square.all.off();";

const ASSIGNMENT = "Showpiece";
/** A floor of loudness, root mean square, that any of the songs passes while it plays. */
const AUDIBLE = 0.003;
const SILENT = 1e-4;
/** Lit fronts make the picture at least this much brighter, as a share of the dark one. */
const BRIGHTER = 1.15;

/** Mean brightness of the stage as it is drawn, 0 to 255. */
function readStage(page: Page): Promise<number> {
  return page.locator(".studio-window-stage canvas").evaluate((element) => {
    const copy = document.createElement("canvas");
    copy.width = 96;
    copy.height = 48;
    const pen = copy.getContext("2d");
    if (!pen) throw new Error("There is no canvas here.");
    pen.drawImage(element as HTMLCanvasElement, 0, 0, copy.width, copy.height);
    const { data } = pen.getImageData(0, 0, copy.width, copy.height);
    let sum = 0;
    for (let i = 0; i < data.length; i += 4)
      sum += 0.2126 * (data[i] ?? 0) + 0.7152 * (data[i + 1] ?? 0) + 0.0722 * (data[i + 2] ?? 0);
    return sum / (data.length / 4);
  });
}

async function untilRan(page: Page): Promise<void> {
  await page
    .getByRole("status")
    .filter({ hasText: /^Ran: \d+ cues?\./ })
    .first()
    .waitFor({ timeout: 60_000, state: "attached" });
}

async function writeShow(person: Person, hands: Hands, title: string): Promise<void> {
  const { page } = person;
  await hands.press(page.getByRole("link", { name: `Begin: ${ASSIGNMENT}` }));
  await hands.press(page.getByRole("link", { name: "Begin", exact: true }));
  await hands.write(page.getByLabel("Title"), title);
  await hands.press(page.getByRole("button", { name: "Open the studio" }));
  await page.locator(".cm-content").waitFor({ timeout: 60_000 });
  await untilRan(page);
}

/** Writes, sees and hears the show; gives what the server made of it. */
async function seeAndHear(page: Page, hands: Hands): Promise<void> {
  await hands.writeScript(page, DARK);
  await hands.press(page.getByRole("button", { name: /^Run/ }));
  await page
    .getByText(/^Saved/)
    .first()
    .waitFor({ timeout: 30_000 });
  await page.waitForTimeout(1500);
  const dark = await readStage(page);
  await hands.writeScript(page, SCRIPT);
  await hands.press(page.getByRole("button", { name: /^Run/ }));
  await expect.poll(() => readStage(page), { timeout: 60_000 }).toBeGreaterThan(dark * BRIGHTER);

  await hands.press(page.getByRole("button", { name: "Play", exact: true }));
  await page.getByRole("button", { name: "Pause" }).waitFor({ timeout: 60_000 });
  expect(await listenFor(page, 6000)).toBeGreaterThan(AUDIBLE);
  await hands.press(page.getByRole("button", { name: "Pause" }));
  await page.getByRole("button", { name: "Play", exact: true }).waitFor();
  // Tones ring out; then nothing sounds.
  await expect.poll(() => listenFor(page, 200), { timeout: 15_000 }).toBeLessThan(SILENT);
}

async function handIn(page: Page, hands: Hands): Promise<void> {
  await hands.press(page.getByRole("button", { name: "Hand in" }));
  const answered = page.waitForResponse(
    (response) => response.url().endsWith("/submissions") && response.request().method() === "POST",
    { timeout: 60_000 },
  );
  await hands.press(page.getByRole("dialog").getByRole("button", { name: "Hand in", exact: true }));
  const response = await answered;
  const sent = response.request().postDataJSON() as { hash: string | null };
  const result = (await response.json()) as {
    run: { hash: string | null; isOk: boolean };
    hashesAgree: boolean;
    unmet: unknown[];
    isLate: boolean;
  };
  expect(result.run.isOk).toBe(true);
  expect(sent.hash).toMatch(/^[0-9a-f]{64}$/);
  // The server's own run came to the very same bytes.
  expect(result.run.hash).toBe(sent.hash);
  expect(result).toMatchObject({ hashesAgree: true, unmet: [], isLate: false });
  await page.getByText(/^Handed in as version 1/).waitFor();
}

async function markAndForward(page: Page, hands: Hands, author: string, title: string): Promise<void> {
  await hands.press(page.getByRole("link", { name: "Marking" }).first());
  await hands.press(page.getByRole("link", { name: `Mark ${ASSIGNMENT}, 7B` }));
  await hands.press(page.getByRole("complementary", { name: "Queue" }).getByRole("link").filter({ hasText: author }));
  await page.getByRole("heading", { level: 1 }).filter({ hasText: title }).waitFor({ timeout: 60_000 });
  await hands.press(page.getByRole("button", { name: "Line 3", exact: true }));
  await hands.write(page.getByLabel("Comment on line 3"), "A clear name for what it does.");
  await hands.press(page.getByRole("button", { name: "Save comment" }));
  await page.getByText("A clear name for what it does.").first().waitFor();
  const criteria = page.getByRole("region", { name: "Rubric" }).getByRole("group");
  const count = await criteria.count();
  expect(count).toBe(4);
  for (let i = 0; i < count; i += 1) await hands.choose(criteria.nth(i).getByRole("radio").nth(2));
  await hands.write(page.getByLabel(/^To /), "You can see the chorus with the sound off.");
  await hands.press(page.getByRole("button", { name: "Release mark" }));
  await page.getByText("Released: the authors see mark and note.").waitFor();
  await hands.press(page.getByRole("button", { name: "Forward to the event" }));
  await hands.write(page.getByLabel(/^Note to the coordinator/), "Runs clean.");
  await hands.press(page.getByRole("dialog").getByRole("button", { name: "Forward", exact: true }));
  await page.getByText("Forwarded, waiting").waitFor();
}

async function planAndPublish(page: Page, hands: Hands, title: string): Promise<void> {
  await hands.press(page.getByRole("link", { name: "Shows" }).first());
  await hands.press(page.getByRole("link", { name: `Watch ${title}` }));
  await hands.press(page.getByRole("button", { name: "Approve" }));
  await hands.press(page.getByRole("link", { name: "Open the lineup" }));
  await hands.press(page.getByRole("button", { name: `Place ${title}…` }));
  await hands.pick(page.getByRole("dialog").getByLabel("Start time"), ", free");
  await hands.press(page.getByRole("dialog").getByRole("button", { name: "Place it" }));
  await page.getByRole("dialog").waitFor({ state: "detached" });
  await hands.press(page.getByRole("button", { name: "Publish" }));
  await hands.press(page.getByRole("dialog").getByRole("button", { name: "Publish" }));
  await page.getByText(/^Lineup \d+ is published/).waitFor();
}

const WALKS = [
  { name: "by mouse", hands: MOUSE, author: "7B-TARN/oren", title: "Gold from the North" },
  { name: "by keyboard alone", hands: KEYBOARD, author: "7B-TARN/june", title: "Blue Hour, Gold Hour" },
] as const;

describe("a student's script reaches the published programme", () => {
  for (const { name, hands, author, title } of WALKS) {
    it(`${name}: written, seen, heard, handed in, marked, forwarded, approved, placed, published`, async () => {
      const people: Person[] = [];
      const open = async () => {
        const person = await openPerson(browser, address);
        people.push(person);
        return person;
      };
      try {
        const student = await open();
        await tapSound(student.context);
        await signInStudent(student.page, author);
        await writeShow(student, hands, title);
        await seeAndHear(student.page, hands);
        await handIn(student.page, hands);

        const teacher = await open();
        await signInStaff(teacher.page, TEACHER);
        await markAndForward(teacher.page, hands, demoStudent(author).displayName, title);

        const coordinator = await open();
        await signInStaff(coordinator.page, COORDINATOR);
        await planAndPublish(coordinator.page, hands, title);

        const family = await open();
        await family.page.goto("/programme");
        await hands.write(family.page.getByLabel("Title, class or school"), title);
        await family.page.getByRole("heading", { name: title }).first().waitFor();

        await student.page.goto("/home");
        await student.page.getByRole("link", { name: `Read the mark: ${ASSIGNMENT}` }).waitFor();
        for (const person of people) expect(person.faults).toEqual([]);
      } catch (error) {
        await keepPictures(people, name);
        throw error;
      } finally {
        for (const person of people) await person.close();
      }
    });
  }
});
