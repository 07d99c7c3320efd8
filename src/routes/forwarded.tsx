import { useQuery } from "@tanstack/react-query";
import type { LoaderFunctionArgs } from "react-router";
import { Page, PageHeader } from "../components/page.tsx";
import { QueryView } from "../components/query-view.tsx";
import { forwardsQuery } from "../features/lineup/api.ts";
import { ForwardedList } from "../features/lineup/forwards/forwarded-list.tsx";
import { ForwardsSkeleton } from "../features/lineup/forwards/shows-inbox.tsx";
import { useNow } from "../hooks/use-now.ts";
import { queryClient } from "../lib/query-client.ts";
import { useEventZone } from "./event-zone.ts";
import { requireSession } from "./guards.ts";

export async function loader({ request }: LoaderFunctionArgs) {
  await requireSession(request, "teacher");
  void queryClient.prefetchQuery(forwardsQuery);
  return null;
}

/** What a teacher forwarded to the event, with the answers. */
export function Component() {
  const forwards = useQuery(forwardsQuery);
  const timeZone = useEventZone();
  const now = useNow();
  return (
    <Page title="Forwarded" density="staff" className="mx-auto max-w-page">
      <PageHeader title="Forwarded" lead="Shows that you sent to the event, and what the coordinator says." />
      <QueryView query={forwards} skeleton={<ForwardsSkeleton />} errorTitle="The forwarded shows could not be loaded.">
        {(list) => <ForwardedList forwards={list} timeZone={timeZone} now={now} />}
      </QueryView>
    </Page>
  );
}
