import type { NameTable } from "../../../sandbox/language/names.ts";
import { LanguageClient } from "../../../src/features/shows/editor/language-client.ts";

/** What the bench asks of its page. */
export interface LanguagePage {
  /** Milliseconds until the notes of each text are there, one after the other, in a new worker. */
  timeNotes(names: NameTable, texts: readonly string[]): Promise<number[]>;
}

const languagePage: LanguagePage = {
  async timeNotes(names, texts) {
    const client = new LanguageClient(names);
    const times: number[] = [];
    for (const text of texts) {
      const start = performance.now();
      const notes = await client.ask("listNotes", text);
      if (notes?.length !== 0) throw new Error("The bench script should have no notes.");
      times.push(performance.now() - start);
    }
    client.dispose();
    return times;
  },
};

Object.assign(globalThis, { languagePage });
