import { useQuery } from "@tanstack/react-query";
import { useSearchParams, type LoaderFunctionArgs } from "react-router";
import { Page, PageHeader } from "../components/page.tsx";
import { QueryView } from "../components/query-view.tsx";
import { forwardsQuery } from "../features/lineup/api.ts";
import { ForwardsSkeleton, INBOX_VIEWS, ShowsInbox } from "../features/lineup/forwards/shows-inbox.tsx";
import { useNow } from "../hooks/use-now.ts";
import { queryClient } from "../lib/query-client.ts";
import { useEventZone } from "./event-zone.ts";
import { requireSession } from "./guards.ts";

export async function loader({ request }: LoaderFunctionArgs) {
  await requireSession(request, "coordinator");
  void queryClient.prefetchQuery(forwardsQuery);
  return null;
}

/** The coordinator's shows: waiting, approved, sent back. */
export function Component() {
  const forwards = useQuery(forwardsQuery);
  const timeZone = useEventZone();
  const now = useNow();
  const [search, setSearch] = useSearchParams();
  const view = INBOX_VIEWS.find((one) => one === search.get("view")) ?? "waiting";
  return (
    <Page title="Shows" density="staff" className="mx-auto max-w-page">
      <PageHeader
        title="Shows"
        lead="Forwarded by the teachers. Watch each, then approve it for the lineup or send it back."
      />
      <QueryView query={forwards} skeleton={<ForwardsSkeleton />} errorTitle="The shows could not be loaded.">
        {(list) => (
          <ShowsInbox
            forwards={list}
            view={view}
            onView={(next) => setSearch({ view: next }, { replace: true })}
            timeZone={timeZone}
            now={now}
          />
        )}
      </QueryView>
    </Page>
  );
}
