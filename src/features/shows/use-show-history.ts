import { useMemo } from "react";
import { decodeRibbon } from "../../../sandbox/timeline/ribbon.ts";
import type { ShowDetail } from "../../../shared/contracts/shows.ts";
import type { VersionId } from "../../../shared/ids.ts";
import { HERE } from "../../lib/format.ts";
import { queryClient } from "../../lib/query-client.ts";
import { presentWhen } from "../../lib/zoned-time.ts";
import { earlierDraftQuery, historyQuery, versionQuery } from "./api.ts";
import type { KeptText } from "./history/kept-text.ts";
import type { HistorySource } from "./history/use-history.ts";

const DRAFT_ID = /^draft-(\d+)$/;

/** The earlier texts of a show that the server keeps: what was handed in, and drafts. */
export function useShowHistory({ show, versions }: ShowDetail): HistorySource {
  return useMemo(
    () => ({
      versions: versions.map((version) => ({
        id: version.id,
        title: `Version ${version.number}`,
        when: presentWhen(version.createdAt, Date.now(), HERE),
        at: version.createdAt,
        by: null,
        ribbon: version.ribbon && decodeRibbon(version.ribbon),
      })),
      listDrafts: async () => {
        const drafts = await queryClient.fetchQuery({ ...historyQuery(show.id), retry: false });
        const isShared = show.authors.length > 1;
        return drafts.map((draft): KeptText => ({
          id: `draft-${draft.revision}`,
          title: "Draft",
          when: presentWhen(draft.savedAt, Date.now(), HERE),
          at: draft.savedAt,
          by: isShared ? draft.by : null,
          ribbon: draft.ribbon && decodeRibbon(draft.ribbon),
        }));
      },
      readText: async (id) => {
        const revision = DRAFT_ID.exec(id)?.[1];
        if (revision !== undefined)
          return (await queryClient.fetchQuery(earlierDraftQuery(show.id, Number(revision)))).source;
        return (await queryClient.fetchQuery(versionQuery(id as VersionId))).source;
      },
    }),
    [show, versions],
  );
}
