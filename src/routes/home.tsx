import { useQuery, useSuspenseQuery } from "@tanstack/react-query";
import { Link, type LoaderFunctionArgs } from "react-router";
import { EmptyState } from "../components/empty-state.tsx";
import { ErrorState } from "../components/error-state.tsx";
import { LinkButton } from "../components/link-button.tsx";
import { Page, PageHeader } from "../components/page.tsx";
import { Ribbon } from "../components/ribbon.tsx";
import { Skeleton, SkeletonGroup } from "../components/skeleton.tsx";
import { assignmentsQuery } from "../features/assignments/api.ts";
import { AssignmentRows } from "../features/assignments/components/assignment-rows.tsx";
import { lessonsQuery } from "../features/course/api.ts";
import { NextThing } from "../features/course/components/next-thing.tsx";
import { programmeQuery } from "../features/lineup/programme/api.ts";
import { ComingShows } from "../features/lineup/programme/coming-shows.tsx";
import { sessionQuery } from "../features/auth/api.ts";
import { showsQuery } from "../features/shows/api.ts";
import { ShowGrid, ShowGridSkeleton } from "../features/shows/components/show-grid.tsx";
import { useNow } from "../hooks/use-now.ts";
import { queryClient } from "../lib/query-client.ts";
import { requireSession } from "./guards.ts";

const SHOWS_HERE = 3;
const COMING_HERE = 4;

export async function loader({ request }: LoaderFunctionArgs) {
  await requireSession(request, "student");
  void queryClient.prefetchQuery(lessonsQuery);
  void queryClient.prefetchQuery(showsQuery());
  void queryClient.prefetchQuery(assignmentsQuery);
  void queryClient.prefetchQuery(programmeQuery);
  return null;
}

/** A pupil's start page: the next thing, one's shows, the class's assignments, what comes on the square. */
export function Component() {
  const { data: session } = useSuspenseQuery(sessionQuery);
  const name = session?.user.displayName ?? "";
  return (
    <Page title="Home">
      <PageHeader title={`Hello, ${name.split(" ")[0]}`} />
      <Next />
      <div className="mt-8 grid grid-cols-[1fr_19.75rem] gap-9 max-wide:grid-cols-1">
        <div className="min-w-0 space-y-9">
          <MyShows reader={name} />
          <MyAssignments />
        </div>
        <Coming />
      </div>
    </Page>
  );
}

function Next() {
  const lessons = useQuery(lessonsQuery);
  if (lessons.isError) {
    return <ErrorState title="Your lessons could not be loaded." onRetry={() => void lessons.refetch()} isRetrying={lessons.isFetching} />;
  }
  if (!lessons.data) {
    return (
      <SkeletonGroup label="Loading what comes next">
        <Skeleton shape="ribbon" className="h-60" />
      </SkeletonGroup>
    );
  }
  return <NextThing lessons={lessons.data} />;
}

function MyShows({ reader }: { reader: string }) {
  const shows = useQuery(showsQuery());
  const now = useNow();
  return (
    <section aria-labelledby="my-shows">
      <div className="mb-3 flex items-center gap-4">
        <h2 id="my-shows">My shows</h2>
        <LinkButton className="ml-auto" to="/shows/new" icon="plus">
          New show
        </LinkButton>
      </div>
      {shows.isError && <ErrorState title="Your shows could not be loaded." onRetry={() => void shows.refetch()} isRetrying={shows.isFetching} />}
      {shows.isPending && <ShowGridSkeleton />}
      {shows.data?.length === 0 && (
        <EmptyState title="No show yet" picture={<Ribbon ribbon={null} label="" />}>
          Begin an assignment, or pick a song and start one of your own. Its ribbon will be here.
        </EmptyState>
      )}
      {shows.data && shows.data.length > 0 && <ShowGrid shows={shows.data.slice(0, SHOWS_HERE)} reader={reader} now={now} />}
      {shows.data && shows.data.length > SHOWS_HERE && (
        <p className="mt-3">
          <Link to="/shows">All {shows.data.length} shows</Link>
        </p>
      )}
    </section>
  );
}

function MyAssignments() {
  const assignments = useQuery(assignmentsQuery);
  const now = useNow();
  return (
    <section aria-labelledby="my-assignments">
      <h2 id="my-assignments" className="mb-1">
        Class assignments
      </h2>
      {assignments.isError && (
        <ErrorState title="The assignments could not be loaded." onRetry={() => void assignments.refetch()} isRetrying={assignments.isFetching} />
      )}
      {assignments.isPending && (
        <SkeletonGroup label="Loading the assignments" className="space-y-4 py-3">
          <Skeleton className="w-1/2" />
          <Skeleton className="w-2/3" />
        </SkeletonGroup>
      )}
      {assignments.data?.length === 0 && (
        <EmptyState title="Nothing is set" icon="page" className="mt-3">
          When your teacher sets an assignment, it is here.
        </EmptyState>
      )}
      {assignments.data && assignments.data.length > 0 && <AssignmentRows assignments={assignments.data} now={now} />}
    </section>
  );
}

function Coming() {
  const programme = useQuery(programmeQuery);
  const coming = programme.data?.shows.filter((show) => show.date >= programme.data.tonight).slice(0, COMING_HERE);
  return (
    <aside aria-labelledby="on-the-square">
      <h2 id="on-the-square" className="mb-1">
        On the square
      </h2>
      {programme.isError && <ErrorState title="The programme could not be loaded." onRetry={() => void programme.refetch()} isRetrying={programme.isFetching} />}
      {programme.isPending && (
        <SkeletonGroup label="Loading the programme" className="space-y-4 py-3">
          <Skeleton shape="ribbon" />
          <Skeleton shape="ribbon" />
        </SkeletonGroup>
      )}
      {coming?.length === 0 && <p className="py-2 text-soft">No night is published yet. When one is, the shows stand here.</p>}
      {coming && coming.length > 0 && <ComingShows shows={coming} />}
      <p className="mt-4">
        <Link to="/programme">The whole programme</Link>
      </p>
    </aside>
  );
}
