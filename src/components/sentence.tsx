export interface SentenceProps {
  /** Backticks mark code. */
  text: string;
}

/** A sentence about a script; what stands in backticks is shown as code. */
export function Sentence({ text }: SentenceProps) {
  return (
    <>
      {text.split("`").map((piece, index) =>
        index % 2 === 1 ? (
          <code key={index} className="font-mono">
            {piece}
          </code>
        ) : (
          piece
        ),
      )}
    </>
  );
}
