import type { Draft, ForwardState, ShowSummary, WorkState } from "../../../shared/contracts/shows.ts";
import { AssignmentIdSchema, ShowIdSchema, SongIdSchema } from "../../../shared/ids.ts";
import type { Db } from "../../db/connection.ts";
import { listSongFacts } from "../../event/song.queries.ts";
import { presentRibbonFace } from "../../show-runs/ribbon-blob.ts";
import { listLatestRuns } from "../../show-runs/runs.queries.ts";
import {
  listAuthorNames,
  listLatestForwards,
  listSubmissionsByShow,
  type SubmissionRow,
} from "../../work/work.queries.ts";
import type { DraftRow, ShowWithDraft } from "./shows.queries.ts";

/** Shows for a list: authors, state of the work and the face of the last good run are fetched once for all. */
export function presentShows(db: Db, rows: readonly ShowWithDraft[]): ShowSummary[] {
  const ids = rows.map((row) => row.show.id);
  const songs = listSongFacts(db);
  const authors = listAuthorNames(db, ids);
  const submissions = listSubmissionsByShow(db, ids);
  const forwards = listLatestForwards(
    db,
    [...submissions.values()].map((submission) => submission.id),
  );
  const runs = listLatestRuns(
    db,
    [...submissions.values()].map((submission) => submission.versionId),
  );
  return rows.map(({ show, draft, assignmentTitle }) => {
    const submission = submissions.get(show.id);
    const song = songs.get(show.songId);
    const run = submission && runs.get(submission.versionId);
    return {
      id: ShowIdSchema.parse(show.id),
      title: show.title,
      songId: SongIdSchema.parse(show.songId),
      songTitle: song?.title ?? "",
      seconds: song?.seconds ?? 0,
      authors: authors.get(show.id) ?? [],
      assignmentId: show.assignmentId === null ? null : AssignmentIdSchema.parse(show.assignmentId),
      assignmentTitle,
      workState: toWorkState(show.assignmentId, submission),
      forwardState: toShownForward(submission && forwards.get(submission.id)),
      savedAt: draft.savedAt,
      isArchived: show.isArchived,
      ribbon: presentRibbonFace(draft.ribbon ?? (run?.summary.isOk ? run.ribbon : null)),
    };
  });
}

/** One show as a list shows it. */
export function presentShow(db: Db, row: ShowWithDraft): ShowSummary {
  const [summary] = presentShows(db, [row]);
  if (!summary) throw new Error("A show that was loaded has a summary.");
  return summary;
}

export function presentDraft(draft: DraftRow): Draft {
  return { revision: draft.revision, source: draft.source, savedAt: draft.savedAt };
}

function toWorkState(assignmentId: string | null, submission: SubmissionRow | undefined): WorkState | null {
  if (submission) return submission.state;
  return assignmentId === null ? null : "working";
}

function toShownForward(forward: { readonly shownState: ForwardState } | undefined): ForwardState | null {
  return forward?.shownState ?? null;
}
