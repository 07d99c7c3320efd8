import type { ReactNode } from "react";
import type { LessonSummary } from "../../../../shared/contracts/course.ts";
import { LinkButton } from "../../../components/link-button.tsx";
import { Page } from "../../../components/page.tsx";
import { StepRail } from "../../../components/step-rail.tsx";

export interface LessonFrameProps {
  lesson: LessonSummary;
  /** Index of the step on screen. */
  here: number;
  /** Text, question and checks. */
  children: ReactNode;
  /** Stage and script. */
  workbench: ReactNode;
}

const KIND_WORDS = {
  predict: "Predict",
  run: "Run",
  investigate: "Investigate",
  change: "Change",
  make: "Make",
} as const;

/** The page of a lesson: the rail of its steps, the text on one side, stage and script on the other. */
export function LessonFrame({ lesson, here, children, workbench }: LessonFrameProps) {
  const linkTo = (index: number) => `/lessons/${lesson.id}?step=${lesson.steps[index]?.id ?? ""}`;
  const step = lesson.steps[here];
  const before = lesson.steps[here - 1];
  const after = lesson.steps[here + 1];
  return (
    <Page title={`${step?.title ?? ""}, ${lesson.title}`} layout="full">
      <div className="flex flex-wrap items-center gap-x-8 gap-y-2 border-b border-line bg-card px-6 pt-2 max-wide:px-4">
        <p className="pb-2">
          <span className="block text-meta text-soft">Lesson {lesson.number}</span>
          <span className="font-head text-5 font-semibold">{lesson.title}</span>
        </p>
        <div className="ml-auto min-w-0 max-wide:ml-0 max-wide:w-full">
          <StepRail
            label={`Steps of ${lesson.title}`}
            steps={lesson.steps.map((each, i) => ({
              label: KIND_WORDS[each.kind],
              state: i === here ? "here" : each.isDone ? "done" : "later",
              to: linkTo(i),
            }))}
          />
        </div>
      </div>
      <div className="grid h-[calc(100dvh-8.25rem)] min-h-[34rem] grid-cols-[41fr_59fr] max-wide:block max-wide:h-auto">
        <div className="flex flex-col gap-4 overflow-y-auto border-r border-line px-8 py-5 max-wide:border-r-0 max-wide:px-4">
          {children}
          <div className="mt-auto flex items-center justify-between gap-3 pt-4">
            {before ? (
              <LinkButton icon="chevron-left" to={linkTo(here - 1)}>
                {KIND_WORDS[before.kind]}
              </LinkButton>
            ) : (
              <LinkButton icon="chevron-left" to="/lessons">
                All lessons
              </LinkButton>
            )}
            {after ? (
              <LinkButton look={step?.isDone ? "main" : "plain"} iconEnd="chevron-right" to={linkTo(here + 1)}>
                {KIND_WORDS[after.kind]}
              </LinkButton>
            ) : (
              <LinkButton look={step?.isDone ? "main" : "plain"} iconEnd="chevron-right" to="/lessons">
                Finish
              </LinkButton>
            )}
          </div>
        </div>
        <div className="overflow-y-auto bg-well p-4 max-wide:p-2">{workbench}</div>
      </div>
    </Page>
  );
}
