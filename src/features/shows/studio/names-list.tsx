import { CHAPTER_TITLES } from "../reference/chapters.ts";
import { joinClasses } from "../../../components/class-names.ts";
import { listWordsIn, wordId, type WordGroup } from "../../../../sandbox/language/reference/index.ts";
import type { ScriptName } from "../editor/script-names.ts";

export interface NamesListProps {
  label: string;
  /** Names with the code they put in; null lists the words of the language, which are only read. */
  items: readonly (ScriptName & { readonly code: string })[] | null;
  isDense?: boolean;
  onInsert: (code: string) => void;
}

/** A list of names; a press puts the code into the script. */
export function NamesList({ label, items, isDense, onInsert }: NamesListProps) {
  if (!items) return <WordList label={label} />;
  return (
    <ul className={joinClasses("studio-names-list", isDense && "is-dense")} aria-label={label}>
      {items.map((item) => (
        <li key={item.code}>
          <button type="button" aria-label={`Put in ${item.code}`} onClick={() => onInsert(item.code)}>
            {item.swatch && <i aria-hidden="true" style={{ backgroundColor: item.swatch }} />}
            <code>{isDense ? item.name : item.code}</code>
            {item.note && <span>{item.note}</span>}
          </button>
        </li>
      ))}
    </ul>
  );
}

/** The chapters of the words, with their titles. */
const CHAPTERS = Object.entries(CHAPTER_TITLES) as [WordGroup, string][];

function WordList({ label }: { label: string }) {
  return (
    <div className="studio-words" role="group" aria-label={label}>
      {CHAPTERS.map(([group, title]) => (
        <section key={group}>
          <h3>{title}</h3>
          <dl>
            {listWordsIn(group).map((word) => (
              <div key={wordId(word)}>
                <dt>
                  <code>{word.usage}</code>
                </dt>
                <dd>{word.meaning}</dd>
              </div>
            ))}
          </dl>
        </section>
      ))}
    </div>
  );
}
