import { useQuery } from "@tanstack/react-query";
import type { LoaderFunctionArgs } from "react-router";
import { Page, PageHeader } from "../components/page.tsx";
import { QueryView } from "../components/query-view.tsx";
import { Skeleton, SkeletonGroup } from "../components/skeleton.tsx";
import { overviewQuery } from "../features/admin/api.ts";
import { DatabaseSection, SchoolsSection } from "../features/admin/components/installation-section.tsx";
import { StaffSection } from "../features/admin/components/staff-section.tsx";
import { sessionQuery } from "../features/auth/api.ts";
import { useNow } from "../hooks/use-now.ts";
import { queryClient } from "../lib/query-client.ts";
import { useEventZone } from "./event-zone.ts";
import { requireSession } from "./guards.ts";

export async function loader({ request }: LoaderFunctionArgs) {
  await requireSession(request, "admin");
  void queryClient.prefetchQuery(overviewQuery);
  return null;
}

/** Schools, staff accounts and the state of the installation. */
export function Component() {
  const overview = useQuery(overviewQuery);
  const { data: session } = useQuery(sessionQuery);
  const timeZone = useEventZone();
  const now = useNow();
  return (
    <Page title="Admin" density="staff" className="mx-auto max-w-page">
      <PageHeader title="Admin" lead="Schools, staff accounts and the state of this installation." />
      <QueryView
        query={overview}
        skeleton={<AdminSkeleton />}
        errorTitle="The installation’s state could not be loaded."
      >
        {({ schools, staff, database }) => (
          <div className="space-y-5">
            <div className="grid grid-cols-2 gap-5 max-wide:grid-cols-1">
              <SchoolsSection schools={schools} />
              <DatabaseSection database={database} timeZone={timeZone} now={now} />
            </div>
            <StaffSection
              staff={staff}
              schools={schools}
              ownId={session?.user.id ?? ""}
              timeZone={timeZone}
              now={now}
            />
          </div>
        )}
      </QueryView>
    </Page>
  );
}

function AdminSkeleton() {
  return (
    <SkeletonGroup label="Loading the installation’s state" className="space-y-5">
      <div className="grid grid-cols-2 gap-5 max-wide:grid-cols-1">
        <Skeleton shape="block" className="h-36" />
        <Skeleton shape="block" className="h-36" />
      </div>
      <Skeleton shape="block" className="h-64" />
    </SkeletonGroup>
  );
}
