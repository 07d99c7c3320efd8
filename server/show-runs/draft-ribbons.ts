import { and, eq } from "drizzle-orm";
import { draftHistory, drafts, shows } from "../db/schema/index.ts";
import type { FeatureDeps } from "../deps.ts";
import { findSong } from "../event/song.queries.ts";
import { getCurrentLayout } from "../event/square.queries.ts";
import { listShowClassIds } from "../work/relations.queries.ts";
import { encodeRibbon } from "./ribbon-blob.ts";

/** Keeps the ribbons of drafts up to date behind the saves. */
export interface DraftRibbons {
  /**
   * Runs the draft in the background and keeps its ribbon if it ran well; returns at once. Saves that
   * come while a run of the show is under way become one more run.
   */
  refresh(showId: string): void;
}

/** The ribbons of one database's drafts. A run that fails leaves the last good ribbon. */
export function createDraftRibbons({ db, runs, log }: FeatureDeps): DraftRibbons {
  /** Shows being run; true: saved again meanwhile. */
  const underWay = new Map<string, boolean>();

  async function runDraft(showId: string): Promise<void> {
    const draft = db
      .select({
        revision: drafts.revision,
        source: drafts.source,
        songId: shows.songId,
        seed: shows.seed,
        assignmentId: shows.assignmentId,
      })
      .from(drafts)
      .innerJoin(shows, eq(shows.id, drafts.showId))
      .where(eq(drafts.showId, showId))
      .get();
    const song = draft && findSong(db, draft.songId);
    if (!draft || !song) return;
    const { layout } = getCurrentLayout(db);
    const [classId] = listShowClassIds(db, { id: showId, assignmentId: draft.assignmentId });
    const judged = await runs.judge(
      { source: draft.source, songId: song.id, song: song.beatMap, layout, seed: draft.seed },
      classId === undefined ? {} : { classId },
    );
    if (judged.problem !== null || judged.ribbon === null) return;
    const ribbon = encodeRibbon(judged.ribbon);
    db.update(drafts).set({ ribbon }).where(eq(drafts.showId, showId)).run();
    db.update(draftHistory)
      .set({ ribbon })
      .where(and(eq(draftHistory.showId, showId), eq(draftHistory.revision, draft.revision)))
      .run();
  }

  async function runUntilSettled(showId: string): Promise<void> {
    while (underWay.get(showId) === true) {
      underWay.set(showId, false);
      try {
        await runDraft(showId);
      } catch (error) {
        // Nothing waits for a ribbon: the draft is saved, and the next save tries again.
        log.warn({ err: error, showId }, "the ribbon of a draft was not drawn");
      }
    }
    underWay.delete(showId);
  }

  return {
    refresh(showId) {
      const isRunning = underWay.has(showId);
      underWay.set(showId, true);
      if (isRunning) return;
      void runUntilSettled(showId);
    },
  };
}
