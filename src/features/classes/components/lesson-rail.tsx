import type { StudentRow } from "../../../../shared/contracts/classes.ts";
import { joinClasses } from "../../../components/class-names.ts";

export interface LessonRailProps {
  lessons: readonly { id: string; number: number; title: string }[];
  progress: StudentRow["lessons"];
}

/** How far a student is: one short bar a lesson, as full as its steps are done. */
export function LessonRail({ lessons, progress }: LessonRailProps) {
  const byId = new Map(progress.map((lesson) => [lesson.lessonId, lesson]));
  const done = lessons.filter(({ id }) => isDone(byId.get(id))).length;
  const here = lessons.find(({ id }) => (byId.get(id)?.stepsDone ?? 0) > 0 && !isDone(byId.get(id)));
  const current = here && byId.get(here.id);
  const words =
    current && here
      ? `${done} of ${lessons.length} lessons done, lesson ${here.number} at step ${current.stepsDone} of ${current.stepCount}`
      : `${done} of ${lessons.length} lessons done`;
  return (
    <div className="flex items-center gap-2.5">
      <div role="img" aria-label={words} className="flex w-44 max-w-full shrink-0 gap-[3px]">
        {lessons.map((lesson) => {
          const steps = byId.get(lesson.id);
          const share = steps && steps.stepCount > 0 ? steps.stepsDone / steps.stepCount : 0;
          return (
            <span
              key={lesson.id}
              title={`${lesson.number}. ${lesson.title}`}
              className="relative h-2.5 flex-1 bg-bar-rest"
            >
              <span
                className={joinClasses("absolute inset-y-0 left-0", share >= 1 ? "bg-spruce" : "bg-blue-ink")}
                style={{ width: `${share * 100}%` }}
              />
            </span>
          );
        })}
      </div>
      <span className="text-meta whitespace-nowrap text-slate tabular-nums">
        {current && here
          ? `lesson ${here.number}, step ${current.stepsDone} of ${current.stepCount}`
          : done === 0
            ? "not begun"
            : `${done} done`}
      </span>
    </div>
  );
}

function isDone(steps: StudentRow["lessons"][number] | undefined): boolean {
  return steps !== undefined && steps.stepCount > 0 && steps.stepsDone >= steps.stepCount;
}
