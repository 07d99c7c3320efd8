import { joinClasses } from "../../../components/class-names.ts";
import { GLOBAL_WORD_NOTES, LIGHTS_WORD_NOTES, SONG_WORD_NOTES, SQUARE_WORD_NOTES } from "../editor/language-words.ts";
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

const GROUPS = [
  { title: "By themselves", words: GLOBAL_WORD_NOTES },
  { title: "square", words: SQUARE_WORD_NOTES },
  { title: "song and sections", words: SONG_WORD_NOTES },
  { title: "Lights", words: LIGHTS_WORD_NOTES },
];

function WordList({ label }: { label: string }) {
  return (
    <div className="studio-words" role="group" aria-label={label}>
      {GROUPS.map(({ title, words }) => (
        <section key={title}>
          <h3>{title}</h3>
          <dl>
            {words.map((word) => (
              <div key={word.word}>
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
