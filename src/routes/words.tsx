import { useQuery } from "@tanstack/react-query";
import type { LoaderFunctionArgs } from "react-router";
import { EmptyState } from "../components/empty-state.tsx";
import { Page, PageHeader } from "../components/page.tsx";
import { QueryView } from "../components/query-view.tsx";
import { Skeleton, SkeletonGroup } from "../components/skeleton.tsx";
import { WordsReference } from "../features/shows/reference/words-reference.tsx";
import { songQuery, songsQuery } from "../features/songs/api.ts";
import { currentSquareQuery } from "../features/square/api.ts";
import { queryClient } from "../lib/query-client.ts";
import type { SongId } from "../../shared/ids.ts";
import { requireSession } from "./guards.ts";

export async function loader({ request }: LoaderFunctionArgs) {
  await requireSession(request);
  void queryClient.prefetchQuery(currentSquareQuery);
  void queryClient.prefetchQuery(songsQuery);
  return null;
}

/** Every word of the show language, with an example that runs on this town's square. */
export function Component() {
  return (
    <Page title="Words">
      <PageHeader title="Words" lead="Every word a script can use. Each example runs on our square." />
      <QueryView query={useQuery(songsQuery)} errorTitle="The songs could not be loaded." skeleton={<WordsSkeleton />}>
        {([first]) =>
          first ? (
            <OnSquare songId={first.id} />
          ) : (
            <EmptyState title="There is no song yet" headingLevel={2} icon="music">
              The examples need a song. The event’s coordinator adds the songs.
            </EmptyState>
          )
        }
      </QueryView>
    </Page>
  );
}

function OnSquare({ songId }: { songId: SongId }) {
  const song = useQuery(songQuery(songId));
  return (
    <QueryView
      query={useQuery(currentSquareQuery)}
      errorTitle="The square could not be loaded."
      skeleton={<WordsSkeleton />}
    >
      {({ layout }) => (
        <QueryView query={song} errorTitle="The song could not be loaded." skeleton={<WordsSkeleton />}>
          {({ beatMap }) => <WordsReference layout={layout} song={beatMap} />}
        </QueryView>
      )}
    </QueryView>
  );
}

function WordsSkeleton() {
  return (
    <SkeletonGroup label="Loading the words" className="grid grid-cols-2 gap-4 max-wide:grid-cols-1">
      {["a", "b", "c", "d"].map((card) => (
        <Skeleton key={card} shape="block" className="h-56" />
      ))}
    </SkeletonGroup>
  );
}
