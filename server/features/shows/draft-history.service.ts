import type { Draft, EarlierDraft } from "../../../shared/contracts/shows.ts";
import type { Db } from "../../db/connection.ts";
import type { Actor } from "../../http/actor.ts";
import { presentRibbonFace } from "../../show-runs/ribbon-blob.ts";
import { getEarlierText, listDraftHistory } from "./draft-history.queries.ts";
import { getRelatedShow } from "./shows.service.ts";

/** Earlier texts of a draft, newest first. Throws `not-found`. */
export function listHistory(db: Db, actor: Actor, showId: string): EarlierDraft[] {
  getRelatedShow(db, actor, showId);
  return listDraftHistory(db, showId).map(({ revision, savedAt, by, ribbon }) => ({
    revision,
    savedAt,
    by,
    ribbon: presentRibbonFace(ribbon),
  }));
}

/** One earlier text of a draft. Throws `not-found`, also for a revision that was thinned out. */
export function getEarlierDraft(db: Db, actor: Actor, showId: string, revision: number): Draft {
  getRelatedShow(db, actor, showId);
  return getEarlierText(db, showId, revision);
}
