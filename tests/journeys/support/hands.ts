import type { Locator, Page } from "playwright-core";

/** How a person works a page: by mouse or by keyboard alone. One journey is walked with both. */
export interface Hands {
  press(target: Locator): Promise<void>;
  /** Writes into a field, in place of what is there. */
  write(target: Locator, text: string): Promise<void>;
  /** Chooses a radio button. */
  choose(target: Locator): Promise<void>;
  /** Chooses the first option of a select whose text holds these words. */
  pick(target: Locator, words: string): Promise<void>;
  /** Writes a whole script into the code editor and leaves it. */
  writeScript(page: Page, source: string): Promise<void>;
}

const EDITOR = ".cm-content";

async function typeScript(page: Page, source: string): Promise<void> {
  await page.keyboard.press("Control+A");
  await page.keyboard.press("Delete");
  // Real keystrokes, one by one: brackets close themselves and words are offered on the way.
  await page.keyboard.type(source, { delay: 5 });
}

async function optionWith(target: Locator, words: string): Promise<string> {
  const options = await target.locator("option").allTextContents();
  const found = options.find((option) => option.includes(words));
  if (found === undefined) throw new Error(`No option says "${words}": ${options.join(" | ")}`);
  return found;
}

export const MOUSE: Hands = {
  press: (target) => target.click(),
  write: (target, text) => target.fill(text),
  choose: (target) => target.check(),
  async pick(target, words) {
    await target.selectOption({ label: await optionWith(target, words) });
  },
  async writeScript(page, source) {
    await page.locator(EDITOR).click();
    await typeScript(page, source);
  },
};

const MOST_TABS = 400;

/** The next stop of the focus. In the editor Tab indents; Escape first lets it out. */
async function pressTab(page: Page): Promise<void> {
  if (await page.evaluate((editor) => document.activeElement?.matches(editor) ?? false, EDITOR))
    await page.keyboard.press("Escape");
  await page.keyboard.press("Tab");
}

/** Presses Tab until the target has the focus. Throws when no number of presses reaches it. */
async function tabTo(target: Locator): Promise<void> {
  await target.waitFor({ state: "visible" });
  const page = target.page();
  for (let presses = 0; presses <= MOST_TABS; presses += 1) {
    if (await target.evaluate((element) => element === document.activeElement)) return;
    await pressTab(page);
  }
  throw new Error(`Tab does not reach ${String(target)}.`);
}

export const KEYBOARD: Hands = {
  async press(target) {
    await tabTo(target);
    await target.page().keyboard.press("Enter");
  },
  async write(target, text) {
    await tabTo(target);
    await target.page().keyboard.press("Control+A");
    await target.page().keyboard.type(text);
  },
  async choose(target) {
    const page = target.page();
    // Arrow keys move inside a radio group; Tab reaches the group at its chosen or first button.
    const group = target.locator("xpath=ancestor::fieldset[1]").getByRole("radio");
    const count = await group.count();
    await tabToAny(group, count);
    for (let presses = 0; presses <= count; presses += 1) {
      if (await target.evaluate((element) => element === document.activeElement)) break;
      await page.keyboard.press("ArrowRight");
    }
    await page.keyboard.press("Space");
  },
  async pick(target, words) {
    const wanted = await optionWith(target, words);
    await tabTo(target);
    const options = await target.locator("option").allTextContents();
    for (let presses = 0; presses <= options.length; presses += 1) {
      const chosen = await target.evaluate((element) => (element as HTMLSelectElement).selectedOptions[0]?.textContent);
      if (chosen === wanted) return;
      await target.page().keyboard.press("ArrowDown");
    }
    throw new Error(`The arrow keys do not reach "${wanted}".`);
  },
  async writeScript(page, source) {
    await tabTo(page.locator(EDITOR));
    await typeScript(page, source);
    // Escape closes what is offered; the next one, before Tab, leaves the editor.
    await page.keyboard.press("Escape");
    await pressTab(page);
  },
};

async function tabToAny(group: Locator, count: number): Promise<void> {
  const page = group.page();
  for (let presses = 0; presses <= MOST_TABS; presses += 1) {
    for (let i = 0; i < count; i += 1) {
      if (await group.nth(i).evaluate((element) => element === document.activeElement)) return;
    }
    await pressTab(page);
  }
  throw new Error("Tab does not reach the radio group.");
}
