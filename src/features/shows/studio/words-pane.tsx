import type { ShowDescription } from "../../../../sandbox/timeline/describe.ts";

export interface WordsPaneProps {
  /** Null before the first good run. */
  description: ShowDescription | null;
  onShow: (tick: number) => void;
}

/** What happens on the square, part by part, for people who can not see it; a press goes to that moment. */
export function WordsPane({ description, onShow }: WordsPaneProps) {
  if (!description) return <p className="studio-empty">Nothing is on stage yet. Run the script first.</p>;
  return (
    <>
      <p className="studio-words-summary">{description.summary}</p>
      <ol className="studio-steps" aria-label="The show, part by part">
        {description.steps.map((step, index) => {
          const [place, ...rest] = step.split(": ");
          return (
            <li key={step}>
              {rest.length > 0 ? (
                <>
                  <button type="button" className="studio-ref" onClick={() => onShow(description.starts[index] ?? 0)}>
                    {place}
                  </button>
                  <span>{rest.join(": ")}</span>
                </>
              ) : (
                <span>{step}</span>
              )}
            </li>
          );
        })}
      </ol>
    </>
  );
}
