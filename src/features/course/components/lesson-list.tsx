import type { LessonSummary } from "../../../../shared/contracts/course.ts";
import { LinkButton } from "../../../components/link-button.tsx";
import { List, ListRow } from "../../../components/list.tsx";
import { ProgressSteps } from "../../../components/progress-steps.tsx";
import { Tag } from "../../../components/tag.tsx";
import { stepsDone } from "../model/progress.ts";

export interface LessonListProps {
  lessons: readonly LessonSummary[];
  /** Teachers read a lesson, pupils work on it. */
  isTeacher: boolean;
  nextLessonId: string | null;
}

/** The course: what each lesson is about, its new words, how far one is. */
export function LessonList({ lessons, isTeacher, nextLessonId }: LessonListProps) {
  return (
    <List isOrdered>
      {lessons.map((lesson) => {
        const done = stepsDone(lesson);
        const total = lesson.steps.length;
        const isDone = done === total;
        const label = isTeacher ? "Read" : isDone ? "Look again" : done > 0 ? "Carry on" : "Start";
        return (
          <ListRow
            key={lesson.id}
            lead={<span className="w-8 font-head text-6 font-semibold text-slate tabular-nums">{lesson.number}</span>}
            title={lesson.title}
            to={`/lessons/${lesson.id}`}
            line={
              <>
                {lesson.summary} <span className="whitespace-nowrap">{lesson.minutes} minutes.</span>
                <span className="mt-1 block">
                  New words:{" "}
                  {lesson.words.map((word, i) => (
                    <span key={word}>
                      {i > 0 && ", "}
                      <code>{word}</code>
                    </span>
                  ))}
                </span>
                {!isTeacher && (
                  <ProgressSteps
                    className="mt-2"
                    ground="paper"
                    total={total}
                    done={done}
                    label={isDone ? "All steps done" : `${done} of ${total} steps done`}
                  />
                )}
              </>
            }
            tag={!isTeacher && isDone ? <Tag state="ok">Done</Tag> : null}
            actions={
              <LinkButton
                look={lesson.id === nextLessonId ? "main" : "plain"}
                to={`/lessons/${lesson.id}`}
                aria-label={`${label}: ${lesson.title}`}
              >
                {label}
              </LinkButton>
            }
          />
        );
      })}
    </List>
  );
}
