import { useQuery } from "@tanstack/react-query";
import { useNavigate, useSearchParams, type LoaderFunctionArgs } from "react-router";
import { AssignmentIdSchema } from "../../shared/ids.ts";
import { EmptyState } from "../components/empty-state.tsx";
import { ErrorState } from "../components/error-state.tsx";
import { Page, PageHeader } from "../components/page.tsx";
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
  const songs = useQuery(songsQuery);
  const assignment = useQuery({ ...assignmentQuery(wanted.data ?? ("none" as never)), enabled: wanted.success });
  const navigate = useNavigate();
  const failed = songs.isError ? songs : assignment.isError ? assignment : null;
  const isReady = songs.data !== undefined && (!wanted.success || assignment.data !== undefined);
  return (
    <Page title="New show">
      <PageHeader title="New show" lead={assignment.data ? `For “${assignment.data.assignment.title}”` : "Pick a song. Your script will light the square to it."} />
      {failed && <ErrorState title="The songs could not be loaded." onRetry={() => void failed.refetch()} isRetrying={failed.isFetching} />}
      {!failed && !isReady && (
        <SkeletonGroup label="Loading the songs" className="max-w-2xl space-y-3">
          <Skeleton shape="block" className="h-16" />
          <Skeleton shape="block" className="h-16" />
        </SkeletonGroup>
      )}
      {isReady && songs.data?.length === 0 && (
        <EmptyState title="There is no song yet" headingLevel={2} icon="music">
          The event’s coordinator adds the songs. Ask your teacher when they come.
        </EmptyState>
      )}
      {isReady && songs.data && songs.data.length > 0 && (
        <NewShowForm
          songs={songs.data}
          {...(assignment.data && { assignment: { id: assignment.data.assignment.id, songId: assignment.data.assignment.songId } })}
          onCreated={(show) => void navigate(`/shows/${show.id}`)}
        />
      )}
    </Page>
  );
}
