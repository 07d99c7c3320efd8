import { lazy, Suspense } from "react";
import { showToast } from "../../../components/toast-queue.ts";
import type { DraftState } from "../drafts/draft-model.ts";
import type { DraftStore } from "../drafts/draft-store.ts";
import type { KeptText } from "../history/kept-text.ts";
import { useHistory, type HistorySource } from "../history/use-history.ts";
import type { ProjectorProps } from "../viewer/projector.tsx";
import { HandInDialog } from "./hand-in-dialog.tsx";
import type { RunState } from "./run-model.ts";

/** What is open over the studio; one at a time. */
export type OpenDialog =
  | { readonly kind: "hand-in" }
  | { readonly kind: "projector" }
  | { readonly kind: "record" }
  | { readonly kind: "two-versions" }
  /** `id`: the text to begin with; null is the newest. */
  | { readonly kind: "history"; readonly id: string | null };

/** Comparing texts is seldom, and its editor is large; the others are for the class, seldom for one alone. */
const HistoryDialog = lazy(async () => ({
  default: (await import("../history/history-dialog.tsx")).HistoryDialog,
}));
const TwoVersionsDialog = lazy(async () => ({
  default: (await import("../history/two-versions-dialog.tsx")).TwoVersionsDialog,
}));
const Projector = lazy(async () => ({ default: (await import("../viewer/projector.tsx")).Projector }));
const RecordDialog = lazy(async () => ({ default: (await import("../recording/record-dialog.tsx")).RecordDialog }));

export interface StudioDialogsProps extends Omit<ProjectorProps, "onClose"> {
  dialog: OpenDialog | null;
  store: DraftStore | null;
  draft: DraftState;
  run: RunState;
  history: HistorySource;
  onHandIn: ((source: string) => Promise<void>) | null;
  onClose: () => void;
}

/** The dialogs of the studio. */
export function StudioDialogs(props: StudioDialogsProps) {
  const { dialog, store, draft, run, onHandIn, onClose, history: source, ...show } = props;
  const history = useHistory(store, source);
  const restore = (text: string, kept: KeptText) => {
    const before = store?.state.source ?? "";
    onClose();
    store?.edit(text);
    showToast({
      title: `${kept.title} of ${kept.when} is your script now.`,
      action: { label: "Undo", onPress: () => store?.edit(before) },
    });
  };
  const choose = (text: string) => {
    onClose();
    void store?.choose(text);
  };
  return (
    <Suspense>
      {dialog?.kind === "hand-in" && onHandIn && (
        <HandInDialog
          title={show.title}
          run={run}
          isRunCurrent={run.ranSource === draft.source}
          onHandIn={() => onHandIn(draft.source)}
          onClose={onClose}
        />
      )}
      {dialog?.kind === "projector" && <Projector {...show} onClose={onClose} />}
      {dialog?.kind === "record" && <RecordDialog {...show} onClose={onClose} />}
      {dialog?.kind === "history" && (
        <HistoryDialog
          history={history}
          source={draft.source}
          firstId={dialog.id}
          onRestore={restore}
          onClose={onClose}
        />
      )}
      {dialog?.kind === "two-versions" && draft.sync.kind === "two-versions" && (
        <TwoVersionsDialog mine={draft.source} theirs={draft.sync.theirs.source} onChoose={choose} onClose={onClose} />
      )}
    </Suspense>
  );
}
