import { useQuery } from "@tanstack/react-query";
import type { LoaderFunctionArgs } from "react-router";
import { Page, PageHeader } from "../components/page.tsx";
import { QueryView } from "../components/query-view.tsx";
import { inboxQuery } from "../features/marking/api.ts";
import { Inbox, InboxSkeleton } from "../features/marking/components/inbox.tsx";
import { queryClient } from "../lib/query-client.ts";
import { useEventZone } from "./event-zone.ts";
import { requireSession } from "./guards.ts";

export async function loader({ request }: LoaderFunctionArgs) {
  await requireSession(request, "teacher");
  void queryClient.prefetchQuery(inboxQuery);
  return null;
}

/** Everything that waits for a mark, by assignment. */
export function Component() {
  const inbox = useQuery(inboxQuery);
  const timeZone = useEventZone();
  const waiting = inbox.data?.reduce((sum, assignment) => sum + assignment.toMark, 0);
  return (
    <Page title="Marking" density="staff" className="mx-auto max-w-page">
      <PageHeader
        title="Marking"
        lead={
          waiting === undefined
            ? undefined
            : waiting === 0
              ? "Nothing waits for a mark."
              : waiting === 1
                ? "1 show waits for a mark."
                : `${waiting} shows wait for a mark.`
        }
      />
      <QueryView query={inbox} skeleton={<InboxSkeleton />} errorTitle="The marking could not be loaded.">
        {(assignments) => <Inbox assignments={assignments} timeZone={timeZone} />}
      </QueryView>
    </Page>
  );
}
