import { useQuery, useSuspenseQuery } from "@tanstack/react-query";
import type { LoaderFunctionArgs } from "react-router";
import { EmptyState } from "../components/empty-state.tsx";
import { Page, PageHeader } from "../components/page.tsx";
import { QueryView } from "../components/query-view.tsx";
import { Skeleton, SkeletonGroup } from "../components/skeleton.tsx";
import { sessionQuery } from "../features/auth/api.ts";
import { lessonsQuery } from "../features/course/api.ts";
import { LessonList } from "../features/course/components/lesson-list.tsx";
import { findNextLesson } from "../features/course/model/progress.ts";
import { queryClient } from "../lib/query-client.ts";
import { requireSession } from "./guards.ts";

export async function loader({ request }: LoaderFunctionArgs) {
  await requireSession(request, "student", "teacher");
  void queryClient.prefetchQuery(lessonsQuery);
  return null;
}

/** The course from first light to showpiece. */
export function Component() {
  const { data: session } = useSuspenseQuery(sessionQuery);
  const isTeacher = session?.user.roles.includes("teacher") ?? false;
  return (
    <Page title="Lessons">
      <PageHeader title="Lessons" lead="Each lesson takes one class hour: predict, run, investigate, change, make." />
      <QueryView
        query={useQuery(lessonsQuery)}
        errorTitle="The lessons could not be loaded."
        skeleton={
          <SkeletonGroup label="Loading the lessons" className="space-y-5">
            <Skeleton shape="block" className="h-20" />
            <Skeleton shape="block" className="h-20" />
            <Skeleton shape="block" className="h-20" />
          </SkeletonGroup>
        }
      >
        {(lessons) =>
          lessons.length === 0 ? (
            <EmptyState title="No lesson is here yet" headingLevel={2} icon="book">
              The course comes with Duskbell. If this stays empty, whoever looks after the installation can help.
            </EmptyState>
          ) : (
            <LessonList
              lessons={lessons}
              isTeacher={isTeacher}
              nextLessonId={isTeacher ? null : (findNextLesson(lessons)?.id ?? null)}
            />
          )
        }
      </QueryView>
    </Page>
  );
}
