import { useQuery } from "@tanstack/react-query";
import { useNavigate, useSearchParams, type LoaderFunctionArgs } from "react-router";
import { AssignmentIdSchema } from "../../shared/ids.ts";
import { EmptyState } from "../components/empty-state.tsx";
import { Page, PageHeader } from "../components/page.tsx";
import { QueryView } from "../components/query-view.tsx";
import { Skeleton, SkeletonGroup } from "../components/skeleton.tsx";
import { assignmentQuery } from "../features/assignments/api.ts";
import { NewShowForm } from "../features/shows/components/new-show-form.tsx";
import { songsQuery } from "../features/songs/api.ts";
import { queryClient } from "../lib/query-client.ts";
import { requireSession } from "./guards.ts";

export async function loader({ request }: LoaderFunctionArgs) {
  await requireSession(request, "student");
  void queryClient.prefetchQuery(songsQuery);
  return null;
}

/** Starts a show, of one's own or for an assignment (`?assignment=`). */
export function Component() {
  const [search] = useSearchParams();
  const wanted = AssignmentIdSchema.safeParse(search.get("assignment"));
  const assignment = useQuery({ ...assignmentQuery(wanted.data ?? "none"), enabled: wanted.success });
  const songs = useQuery(songsQuery);
  const navigate = useNavigate();
  const forAssignment = assignment.data?.assignment;
  return (
    <Page title="New show">
      <PageHeader
        title="New show"
        lead={forAssignment ? `For “${forAssignment.title}”` : "Pick a song. Your script will light the square to it."}
      />
      <QueryView query={songs} errorTitle="The songs could not be loaded." skeleton={<SongsSkeleton />}>
        {(list) =>
          list.length === 0 ? (
            <EmptyState title="There is no song yet" headingLevel={2} icon="music">
              The event’s coordinator adds the songs. Ask your teacher when they come.
            </EmptyState>
          ) : wanted.success ? (
            <QueryView query={assignment} errorTitle="The assignment could not be loaded." skeleton={<SongsSkeleton />}>
              {({ assignment: { id, songId } }) => (
                <NewShowForm
                  songs={list}
                  assignment={{ id, songId }}
                  onCreated={(show) => void navigate(`/shows/${show.id}`)}
                />
              )}
            </QueryView>
          ) : (
            <NewShowForm songs={list} onCreated={(show) => void navigate(`/shows/${show.id}`)} />
          )
        }
      </QueryView>
    </Page>
  );
}

function SongsSkeleton() {
  return (
    <SkeletonGroup label="Loading the songs" className="max-w-2xl space-y-3">
      <Skeleton shape="block" className="h-16" />
      <Skeleton shape="block" className="h-16" />
    </SkeletonGroup>
  );
}
