import type { LessonSummary } from "../../../../shared/contracts/course.ts";
import { Card } from "../../../components/card.tsx";
import { LinkButton } from "../../../components/link-button.tsx";
import { ProgressSteps } from "../../../components/progress-steps.tsx";
import { StreetScene } from "../../../components/street-scene.tsx";
import { findNextLesson, stepsDone } from "../model/progress.ts";

export interface NextThingProps {
  lessons: readonly LessonSummary[];
}

/** The one next action of a pupil: the lesson that is under way, the next one, or a show of one's own. */
export function NextThing({ lessons }: NextThingProps) {
  const lesson = findNextLesson(lessons);
  const done = lesson ? stepsDone(lesson) : 0;
  const isFirst = lessons.every((each) => stepsDone(each) === 0);
  const here = lesson?.steps[done];
  return (
    <Card
      as="section"
      isLifted
      aria-labelledby="next-thing"
      className="grid grid-cols-[1fr_1.15fr] overflow-hidden border-dusk bg-dusk p-0 max-wide:grid-cols-1"
    >
      <div className="on-dusk px-7 py-7 max-wide:order-2 max-wide:px-4 max-wide:py-5">
        <p className="text-on-dusk-soft">{isFirst ? "Start here" : "Next thing to do"}</p>
        {lesson ? (
          <>
            <h2 id="next-thing" className="mt-1 text-6">
              {lesson.title}
            </h2>
            <p className="mt-2 text-on-dusk-soft">
              Lesson {lesson.number}
              {here && (
                <>
                  {" · "}
                  {done === 0
                    ? `${lesson.minutes} minutes, `
                    : `you are on step ${done + 1} of ${lesson.steps.length}, `}
                  <em>{here.kind}</em>
                </>
              )}
            </p>
            <ProgressSteps
              className="mt-4"
              total={lesson.steps.length}
              done={done}
              label={`Step ${done + 1} of ${lesson.steps.length}`}
            />
            <LinkButton
              className="mt-5"
              look="lamp"
              size="large"
              icon="play"
              to={`/lessons/${lesson.id}${here ? `?step=${here.id}` : ""}`}
            >
              {done === 0 ? "Start the lesson" : "Carry on"}
            </LinkButton>
          </>
        ) : (
          <>
            <h2 id="next-thing" className="mt-1 text-6">
              All lessons are done
            </h2>
            <p className="mt-2 text-on-dusk-soft">Write a show of your own for the square.</p>
            <LinkButton className="mt-5" look="lamp" size="large" icon="plus" to="/shows/new">
              New show
            </LinkButton>
          </>
        )}
      </div>
      <StreetScene
        className="min-h-60 max-wide:order-1 max-wide:h-32 max-wide:min-h-0"
        lighting={isFirst ? "one" : "slow"}
      />
    </Card>
  );
}
