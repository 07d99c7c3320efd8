import { useInfiniteQuery } from "@tanstack/react-query";
import type { LoaderFunctionArgs } from "react-router";
import { Button } from "../components/button.tsx";
import { Notice } from "../components/notice.tsx";
import { Page, PageHeader } from "../components/page.tsx";
import { QueryView } from "../components/query-view.tsx";
import { auditQuery } from "../features/admin/api.ts";
import { AuditSkeleton, AuditTable } from "../features/admin/components/audit-table.tsx";
import { queryClient } from "../lib/query-client.ts";
import { useEventZone } from "./event-zone.ts";
import { requireSession } from "./guards.ts";

export async function loader({ request }: LoaderFunctionArgs) {
  await requireSession(request, "admin");
  void queryClient.prefetchInfiniteQuery(auditQuery);
  return null;
}

/** The audit log, newest first, with whether its chain is whole. */
export function Component() {
  const audit = useInfiniteQuery(auditQuery);
  const timeZone = useEventZone();
  return (
    <Page title="Audit log" density="staff" className="mx-auto max-w-page">
      <PageHeader
        title="Audit log"
        lead="Who did what, newest first. Rows are chained: a row that is changed or taken out breaks the chain."
      />
      <QueryView query={audit} skeleton={<AuditSkeleton />} errorTitle="The audit log could not be loaded.">
        {({ pages }) => (
          <div className="space-y-4">
            {pages.every((page) => page.isChainWhole) ? (
              <Notice tone="ok" title="The chain is whole." />
            ) : (
              <Notice tone="stop" title="The chain is broken.">
                A row was changed or taken out after it was written. Keep a copy of the database and of its backups, and
                find out who had access to the file.
              </Notice>
            )}
            <AuditTable rows={pages.flatMap((page) => page.rows)} timeZone={timeZone} />
            {audit.hasNextPage && (
              <Button
                icon="chevron-down"
                isPending={audit.isFetchingNextPage}
                onPress={() => void audit.fetchNextPage()}
              >
                Older rows
              </Button>
            )}
          </div>
        )}
      </QueryView>
    </Page>
  );
}
