import { useEffect, useState } from "react";
import {
  listWordsIn,
  WORD_GROUPS,
  type WordEntry,
  type WordGroup,
  wordId,
} from "../../../../sandbox/language/reference/index.ts";
import type { BeatMap } from "../../../../shared/contracts/songs.ts";
import type { Layout } from "../../../../shared/contracts/square.ts";
import { EmptyState } from "../../../components/empty-state.tsx";
import { TextField } from "../../../components/text-field.tsx";
import { useDisposable } from "../../../hooks/use-disposable.ts";
import { CHAPTER_TITLES } from "./chapters.ts";
import { ExampleRunner } from "./example-runner.ts";
import { WordCard } from "./word-card.tsx";

export interface WordsReferenceProps {
  layout: Layout;
  song: BeatMap;
}

/** All words by chapter, with a search. Examples are written with the names of the square and the song, and run there. */
export function WordsReference({ layout, song }: WordsReferenceProps) {
  const [wanted, setWanted] = useState("");
  const runner = useDisposable(() => new ExampleRunner(layout, song), [layout, song]);
  const chapters = WORD_GROUPS.map((group) => ({
    group,
    words: listWordsIn(group).filter((word) => fits(word, wanted)),
  }));
  const count = chapters.reduce((sum, { words }) => sum + words.length, 0);

  useEffect(() => {
    // The browser looked for the place before the cards were there.
    document.getElementById(decodeURIComponent(location.hash.slice(1)))?.scrollIntoView();
  }, []);

  return (
    <>
      <div className="mb-6 flex flex-wrap items-end gap-x-8 gap-y-3">
        <TextField
          label="Find a word"
          type="search"
          placeholder="fade, bar, luck …"
          value={wanted}
          onChange={(event) => setWanted(event.target.value)}
          className="w-full max-w-xs"
        />
        <nav aria-label="Chapters">
          <ul className="flex flex-wrap gap-x-4 gap-y-1">
            {WORD_GROUPS.map((group) => (
              <li key={group}>
                <a href={`#chapter-${group}`} className="inline-block py-1">
                  {CHAPTER_TITLES[group]}
                </a>
              </li>
            ))}
          </ul>
        </nav>
      </div>
      <p role="status" className="sr-only">
        {count} words
      </p>
      {count === 0 && (
        <EmptyState title={`No word has “${wanted}” in it`} headingLevel={2} icon="search">
          Try a shorter piece of it, or what it does: “dark”, “beat”, “luck”.
        </EmptyState>
      )}
      {chapters.map(({ group, words }) =>
        words.length === 0 ? null : <Chapter key={group} group={group} words={words} runner={runner} />,
      )}
    </>
  );
}

function Chapter({
  group,
  words,
  runner,
}: {
  group: WordGroup;
  words: readonly WordEntry[];
  runner: ExampleRunner | null;
}) {
  return (
    <section aria-labelledby={`chapter-${group}`} className="mb-9">
      <h2 id={`chapter-${group}`} className="mb-3 scroll-mt-20">
        {CHAPTER_TITLES[group]}
      </h2>
      <div className="grid grid-cols-2 gap-4 max-wide:grid-cols-1">
        {words.map((entry) => (
          <WordCard key={wordId(entry)} entry={entry} runner={runner} />
        ))}
      </div>
    </section>
  );
}

/** Whether a word, its meaning or its example has all that was typed. */
function fits({ word, usage, meaning, example, group }: WordEntry, wanted: string): boolean {
  const text = `${word} ${usage} ${meaning} ${example} ${CHAPTER_TITLES[group]}`.toLowerCase();
  return wanted
    .toLowerCase()
    .split(/\s+/)
    .every((piece) => text.includes(piece));
}
