import { useEffect, useState, useSyncExternalStore } from "react";
import { type QueryClient, useQueryClient } from "@tanstack/react-query";
import { markingContract, type Mark } from "../../../shared/contracts/marking.ts";
import type { SubmissionId } from "../../../shared/ids.ts";
import { callApi } from "../../lib/api-client.ts";
import { submissionQuery } from "./api.ts";
import { MarkDraft, type MarkDraftState, type MarkText } from "./model/mark-draft.ts";

/** Drafts of this visit: they outlive the page, so that one that is still being sent is never dropped. */
const drafts = new Map<string, MarkDraft>();

function openDraft(submissionId: SubmissionId, saved: MarkText, client: QueryClient): MarkDraft {
  const open = drafts.get(submissionId);
  if (open) return open;
  const draft = new MarkDraft(saved, {
    storage: window.localStorage,
    storageKey: `duskbell:mark:${submissionId}`,
    send: async (text) =>
      (
        await callApi(markingContract.saveMark, {
          params: { submissionId },
          body: { levels: { ...text.levels }, note: text.note },
        })
      ).mark,
    onSaved: (mark) =>
      client.setQueryData(submissionQuery(submissionId).queryKey, (detail) => detail && { ...detail, mark }),
  });
  drafts.set(submissionId, draft);
  return draft;
}

export interface MarkDraftView extends MarkDraftState {
  readonly setLevel: (criterionId: string, level: number) => void;
  readonly setNote: (note: string) => void;
  readonly flush: () => Promise<boolean>;
}

/** The mark being written for a submission, with its save state. `mark` is what the server holds, null before the first. */
export function useMarkDraft(submissionId: SubmissionId, mark: Mark | null): MarkDraftView {
  const client = useQueryClient();
  const [draft] = useState(() => openDraft(submissionId, toText(mark), client));
  const state = useSyncExternalStore(draft.subscribe, draft.getState);

  useEffect(() => {
    draft.adopt(toText(mark));
  }, [draft, mark]);
  useEffect(() => {
    // A tab that is closed or put away sends first; what does not arrive is kept on this computer.
    const handleHide = () => {
      if (document.visibilityState === "hidden") void draft.flush();
    };
    document.addEventListener("visibilitychange", handleHide);
    return () => {
      document.removeEventListener("visibilitychange", handleHide);
      void draft.flush();
    };
  }, [draft]);

  return {
    ...state,
    setLevel: (criterionId, level) => draft.setLevel(criterionId, level),
    setNote: (note) => draft.setNote(note),
    flush: () => draft.flush(),
  };
}

const toText = (mark: Mark | null): MarkText => ({ levels: mark?.levels ?? {}, note: mark?.note ?? "" });
