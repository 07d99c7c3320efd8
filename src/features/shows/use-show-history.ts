import { useMemo } from "react";
import { decodeRibbon } from "../../../sandbox/timeline/ribbon.ts";
import type { ShowDetail } from "../../../shared/contracts/shows.ts";
import type { ShowId } from "../../../shared/ids.ts";
import { useNow } from "../../hooks/use-now.ts";
import { HERE } from "../../lib/format.ts";
import { queryClient } from "../../lib/query-client.ts";
import { presentWhen } from "../../lib/zoned-time.ts";
import { earlierDraftQuery, historyQuery, versionQuery } from "./api.ts";
import type { KeptText } from "./history/kept-text.ts";
import type { HistorySource } from "./history/use-history.ts";

const DRAFT_ID = /^draft-(\d+)$/;

/** The earlier texts of a show that the server keeps: what was handed in, and drafts. */
export function useShowHistory({ show, versions }: ShowDetail): HistorySource {
  const now = useNow();
  const handedIn = useMemo(
    () =>
      versions.map((version) => ({
        id: version.id,
        title: `Version ${version.number}`,
        when: presentWhen(version.createdAt, now, HERE),
        at: version.createdAt,
        by: null,
        ribbon: version.ribbon && decodeRibbon(version.ribbon),
      })),
    [versions, now],
  );
  const isShared = show.authors.length > 1;
  const reading = useMemo(
    () => ({
      listDrafts: () => listDrafts(show.id, isShared),
      readText: (id: string) => readText(show.id, id),
    }),
    [show.id, isShared],
  );
  return { versions: handedIn, ...reading };
}

async function listDrafts(showId: ShowId, isShared: boolean): Promise<KeptText[]> {
  const drafts = await queryClient.fetchQuery({ ...historyQuery(showId), retry: false });
  return drafts.map((draft) => ({
    id: `draft-${draft.revision}`,
    title: "Draft",
    when: presentWhen(draft.savedAt, Date.now(), HERE),
    at: draft.savedAt,
    by: isShared ? draft.by : null,
    ribbon: draft.ribbon && decodeRibbon(draft.ribbon),
  }));
}

async function readText(showId: ShowId, id: string): Promise<string> {
  const revision = DRAFT_ID.exec(id)?.[1];
  if (revision === undefined) return (await queryClient.fetchQuery(versionQuery(id))).source;
  return (await queryClient.fetchQuery(earlierDraftQuery(showId, Number(revision)))).source;
}
