import { useQuery, useSuspenseQuery } from "@tanstack/react-query";
import { Link, type LoaderFunctionArgs } from "react-router";
import { EmptyState } from "../components/empty-state.tsx";
import { LinkButton } from "../components/link-button.tsx";
import { Page, PageHeader } from "../components/page.tsx";
import { QueryView } from "../components/query-view.tsx";
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
import { Invitations } from "../features/shows/components/invitations.tsx";
import { ShowGrid, ShowGridSkeleton } from "../features/shows/components/show-grid.tsx";
import { invitationsQuery } from "../features/shows/partners-api.ts";
import { useNow } from "../hooks/use-now.ts";
import { queryClient } from "../lib/query-client.ts";
import { requireSession } from "./guards.ts";

const SHOWS_HERE = 3;
const COMING_HERE = 4;

export async function loader({ request }: LoaderFunctionArgs) {
  await requireSession(request, "student");
  void queryClient.prefetchQuery(lessonsQuery);
  void queryClient.prefetchQuery(showsQuery());
  void queryClient.prefetchQuery(invitationsQuery);
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
      <Invitations />
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
  return (
    <QueryView
      query={useQuery(lessonsQuery)}
      errorTitle="Your lessons could not be loaded."
      skeleton={
        <SkeletonGroup label="Loading what comes next">
          <Skeleton shape="ribbon" className="h-60" />
        </SkeletonGroup>
      }
    >
      {(lessons) => <NextThing lessons={lessons} />}
    </QueryView>
  );
}

function MyShows({ reader }: { reader: string }) {
  const now = useNow();
  return (
    <section aria-labelledby="my-shows">
      <div className="mb-3 flex items-center gap-4">
        <h2 id="my-shows">My shows</h2>
        <LinkButton className="ml-auto" to="/shows/new" icon="plus">
          New show
        </LinkButton>
      </div>
      <QueryView
        query={useQuery(showsQuery())}
        errorTitle="Your shows could not be loaded."
        skeleton={<ShowGridSkeleton />}
      >
        {(shows) =>
          shows.length === 0 ? (
            <EmptyState title="No show yet" picture={<Ribbon ribbon={null} label="" />}>
              Begin an assignment, or pick a song and start one of your own. Its ribbon will be here.
            </EmptyState>
          ) : (
            <>
              <ShowGrid shows={shows.slice(0, SHOWS_HERE)} reader={reader} now={now} />
              {shows.length > SHOWS_HERE && (
                <p className="mt-3">
                  <Link to="/shows">All {shows.length} shows</Link>
                </p>
              )}
            </>
          )
        }
      </QueryView>
    </section>
  );
}

function MyAssignments() {
  const now = useNow();
  return (
    <section aria-labelledby="my-assignments">
      <h2 id="my-assignments" className="mb-1">
        Class assignments
      </h2>
      <QueryView
        query={useQuery(assignmentsQuery)}
        errorTitle="The assignments could not be loaded."
        skeleton={
          <SkeletonGroup label="Loading the assignments" className="space-y-4 py-3">
            <Skeleton className="w-1/2" />
            <Skeleton className="w-2/3" />
          </SkeletonGroup>
        }
      >
        {(assignments) =>
          assignments.length === 0 ? (
            <EmptyState title="Nothing is set" icon="page" className="mt-3">
              When your teacher sets an assignment, it is here.
            </EmptyState>
          ) : (
            <AssignmentRows assignments={assignments} now={now} />
          )
        }
      </QueryView>
    </section>
  );
}

function Coming() {
  return (
    <aside aria-labelledby="on-the-square">
      <h2 id="on-the-square" className="mb-1">
        On the square
      </h2>
      <QueryView
        query={useQuery(programmeQuery)}
        errorTitle="The programme could not be loaded."
        skeleton={
          <SkeletonGroup label="Loading the programme" className="space-y-4 py-3">
            <Skeleton shape="ribbon" />
            <Skeleton shape="ribbon" />
          </SkeletonGroup>
        }
      >
        {({ shows, tonight }) => {
          const coming = shows.filter((show) => show.date >= tonight).slice(0, COMING_HERE);
          if (coming.length === 0)
            return <p className="py-2 text-soft">No night is published yet. When one is, the shows stand here.</p>;
          return <ComingShows shows={coming} />;
        }}
      </QueryView>
      <p className="mt-4">
        <Link to="/programme">The whole programme</Link>
      </p>
    </aside>
  );
}
