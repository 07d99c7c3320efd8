import { useId } from "react";
import type { LessonStep } from "../../../../shared/contracts/course.ts";
import { Icon } from "../../../components/icon.tsx";
import { Notice } from "../../../components/notice.tsx";
import { CodeText } from "./lesson-text.tsx";

export interface StepQuestionProps {
  question: NonNullable<LessonStep["question"]>;
  /** Index of the choice picked; null before. */
  answer: number | null;
  onAnswer: (choice: number) => void;
  /** Why the answer could not be kept. */
  error: string | null;
}

/** A question with choices. Each choice has a reply that explains; a choice can be changed. */
export function StepQuestion({ question, answer, onAnswer, error }: StepQuestionProps) {
  const name = useId();
  const picked = answer === null ? undefined : question.choices[answer];
  return (
    <div className="space-y-3">
      <fieldset className="rounded-sheet border border-line bg-card p-4 shadow-sheet-1">
        <legend className="float-left mb-2 w-full font-semibold">
          <CodeText text={question.ask} />
        </legend>
        <div className="clear-both space-y-2">
          {question.choices.map((choice, i) => (
            <label
              key={choice.text}
              className="flex cursor-pointer items-start gap-3 rounded-cut border-[1.5px] border-rim px-3 py-2.5 has-checked:border-ink has-checked:bg-well"
            >
              <input
                type="radio"
                name={name}
                className="mt-0.5 size-5 accent-main"
                checked={answer === i}
                onChange={() => onAnswer(i)}
              />
              <span>
                <CodeText text={choice.text} />
              </span>
            </label>
          ))}
        </div>
      </fieldset>
      <div aria-live="polite">
        {picked && (
          <div
            className={`flex gap-3 border-l-4 px-4 py-3 ${picked.isRight ? "border-spruce bg-spruce-tint" : "border-lamp-ink bg-lamp-tint"}`}
          >
            <Icon name={picked.isRight ? "tick" : "knot"} label={picked.isRight ? "Yes" : "Not yet"} />
            <p>
              <CodeText text={picked.answer} />
            </p>
          </div>
        )}
      </div>
      {error !== null && (
        <Notice tone="warn" role="alert" title="Your answer is not kept yet.">
          {error}
        </Notice>
      )}
    </div>
  );
}
