import { Fragment } from "react";

/** A sentence in which `code` stands in backticks. */
export function CodeText({ text }: { text: string }) {
  return (
    <>
      {text
        .split("`")
        .map((piece, i) => (i % 2 === 1 ? <code key={i}>{piece}</code> : <Fragment key={i}>{piece}</Fragment>))}
    </>
  );
}

/** Short paragraphs of a step. */
export function LessonText({ paragraphs }: { paragraphs: readonly string[] }) {
  return (
    <div className="space-y-3">
      {paragraphs.map((paragraph, i) => (
        <p key={i}>
          <CodeText text={paragraph} />
        </p>
      ))}
    </div>
  );
}
