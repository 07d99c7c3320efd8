import { useQuery } from "@tanstack/react-query";
import { useSearchParams, type LoaderFunctionArgs } from "react-router";
import { Page } from "../components/page.tsx";
import { QueryView } from "../components/query-view.tsx";
import { Skeleton, SkeletonGroup } from "../components/skeleton.tsx";
import { SubBand } from "../components/sub-band.tsx";
import { lineupQuery } from "../features/lineup/api.ts";
import { LineupBoard } from "../features/lineup/components/lineup-board.tsx";
import { findOpeningWeek, listWeeks } from "../features/lineup/model/board.ts";
import { useNow } from "../hooks/use-now.ts";
import { queryClient } from "../lib/query-client.ts";
import { requireSession } from "./guards.ts";

export async function loader({ request }: LoaderFunctionArgs) {
  await requireSession(request, "coordinator");
  void queryClient.prefetchQuery(lineupQuery);
  return null;
}

/** The season's plan. The week on the board is in the address: `?week=2026-12-07`. */
export function Component() {
  const lineup = useQuery(lineupQuery);
  const now = useNow();
  const [search, setSearch] = useSearchParams();
  return (
    <Page title="Lineup" density="staff" layout="full">
      <QueryView
        query={lineup}
        skeleton={<BoardSkeleton />}
        errorTitle="The lineup could not be loaded."
        frame={(message) => (
          <>
            <SubBand title="Lineup" />
            <div className="p-6">{message}</div>
          </>
        )}
      >
        {(plan) => {
          const asked = search.get("week");
          const monday = asked !== null && listWeeks(plan.season).includes(asked) ? asked : findOpeningWeek(plan);
          return (
            <LineupBoard
              lineup={plan}
              monday={monday}
              now={now}
              onMonday={(week) => setSearch({ week }, { replace: true, preventScrollReset: true })}
            />
          );
        }}
      </QueryView>
    </Page>
  );
}

function BoardSkeleton() {
  return (
    <>
      <SubBand title="Lineup" />
      <SkeletonGroup
        label="Loading the lineup"
        className="grid grid-cols-[214px_minmax(0,1fr)_248px] max-wide:grid-cols-1"
      >
        <div className="space-y-5 border-r border-line bg-card p-3 max-wide:hidden">
          {["a", "b", "c", "d", "e"].map((row) => (
            <div key={row} className="space-y-2">
              <Skeleton className="w-32" />
              <Skeleton shape="ribbon" className="h-4!" />
            </div>
          ))}
        </div>
        <div className="grid grid-cols-7 gap-1.5 p-3 pl-14 max-wide:grid-cols-1 max-wide:pl-3">
          {Array.from({ length: 35 }, (_, place) => (
            <Skeleton key={place} shape="block" className="h-[59px]" />
          ))}
        </div>
        <div className="space-y-4 border-l border-line bg-card p-3">
          <Skeleton className="w-32" />
          <Skeleton shape="block" className="h-24" />
        </div>
      </SkeletonGroup>
    </>
  );
}
