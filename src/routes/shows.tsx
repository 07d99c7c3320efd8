import { useQuery, useSuspenseQuery } from "@tanstack/react-query";
import { useSearchParams, type LoaderFunctionArgs } from "react-router";
import { EmptyState } from "../components/empty-state.tsx";
import { LinkButton } from "../components/link-button.tsx";
import { Page, PageHeader } from "../components/page.tsx";
import { QueryView } from "../components/query-view.tsx";
import { Ribbon } from "../components/ribbon.tsx";
import { sessionQuery } from "../features/auth/api.ts";
import { showsQuery } from "../features/shows/api.ts";
import { Invitations } from "../features/shows/components/invitations.tsx";
import { ShowGrid, ShowGridSkeleton } from "../features/shows/components/show-grid.tsx";
import { ShowMenu } from "../features/shows/components/show-menu.tsx";
import { useNow } from "../hooks/use-now.ts";
import { queryClient } from "../lib/query-client.ts";
import { requireSession } from "./guards.ts";

function shownShows(request: URLSearchParams): "yes" | "no" {
  return request.get("archived") === "yes" ? "yes" : "no";
}

export async function loader({ request }: LoaderFunctionArgs) {
  await requireSession(request, "student");
  void queryClient.prefetchQuery(showsQuery(shownShows(new URL(request.url).searchParams)));
  return null;
}

/** All shows of a pupil; archived ones apart. */
export function Component() {
  const [search] = useSearchParams();
  const archived = shownShows(search);
  const { data: session } = useSuspenseQuery(sessionQuery);
  const now = useNow();
  const isArchive = archived === "yes";
  return (
    <Page title={isArchive ? "Archived shows" : "My shows"}>
      <PageHeader
        title={isArchive ? "Archived shows" : "My shows"}
        actions={
          <>
            <LinkButton look="quiet" to={isArchive ? "/shows" : "/shows?archived=yes"}>
              {isArchive ? "Back to my shows" : "Archived shows"}
            </LinkButton>
            <LinkButton look="main" to="/shows/new" icon="plus">
              New show
            </LinkButton>
          </>
        }
      />
      {!isArchive && <Invitations />}
      <QueryView
        query={useQuery(showsQuery(archived))}
        errorTitle="Your shows could not be loaded."
        skeleton={<ShowGridSkeleton />}
      >
        {(shows) =>
          shows.length === 0 ? (
            <EmptyState
              title={isArchive ? "Nothing is archived" : "No show yet"}
              headingLevel={2}
              picture={<Ribbon ribbon={null} label="" />}
            >
              {isArchive
                ? "A show that you archive waits here. You can bring it back at any time."
                : "Pick a song and write the first line. The ribbon of your show will be here."}
            </EmptyState>
          ) : (
            <ShowGrid
              shows={shows}
              reader={session?.user.displayName ?? ""}
              now={now}
              actionsOf={(show) => <ShowMenu show={show} />}
            />
          )
        }
      </QueryView>
    </Page>
  );
}
