import { useEffect, useMemo, useState } from "react";
import { Button } from "../../../components/button.tsx";
import { Dialog } from "../../../components/dialog.tsx";
import { EmptyState } from "../../../components/empty-state.tsx";
import { Notice } from "../../../components/notice.tsx";
import { Ribbon } from "../../../components/ribbon.tsx";
import { Select } from "../../../components/select.tsx";
import { Skeleton } from "../../../components/skeleton.tsx";
import { presentKeptText, type KeptText } from "./kept-text.ts";
import { ScriptCompareView } from "./script-compare-view.tsx";
import type { History } from "./use-history.ts";

const NOW = "now";

export interface HistoryDialogProps {
  history: History;
  /** The script in the editor. */
  source: string;
  /** The entry to open with; null is the newest. */
  firstId: string | null;
  onRestore: (source: string, text: KeptText) => void;
  onClose: () => void;
}

/** Every earlier text of a show with its ribbon; one beside the script, or beside another; any may become the script again. */
export function HistoryDialog({ history, source, firstId, onRestore, onClose }: HistoryDialogProps) {
  const { texts, isPartial, load } = history;
  const [pickedId, setPickedId] = useState(firstId);
  const [otherId, setOtherId] = useState(NOW);
  useEffect(load, [load]);
  const picked = texts.find((text) => text.id === pickedId) ?? texts[0] ?? null;
  const other = texts.find((text) => text.id === otherId) ?? null;
  const pickedText = useText(picked?.id ?? null, history.readText);
  const otherText = useText(other?.id ?? null, history.readText);
  const earlier = useMemo(
    () => picked && pickedText.source !== null && { name: presentKeptText(picked), source: pickedText.source },
    [picked, pickedText.source],
  );
  const later = useMemo(() => {
    if (!other) return { name: "The script now", source };
    return otherText.source === null ? null : { name: presentKeptText(other), source: otherText.source };
  }, [other, otherText.source, source]);
  const isFailed = pickedText.isFailed || otherText.isFailed;
  return (
    <Dialog
      isOpen
      onClose={onClose}
      title="History of this script"
      size="full"
      actions={
        <>
          <p className="mr-auto self-center text-soft max-wide:hidden">
            Restoring is an edit like any other: undo brings your script back.
          </p>
          <Button onPress={onClose}>Close</Button>
          <Button
            look="main"
            icon="undo"
            disabledReason={restoreReason(picked, pickedText.source, source)}
            onPress={() => picked && pickedText.source !== null && onRestore(pickedText.source, picked)}
          >
            Restore
          </Button>
        </>
      }
    >
      {isPartial && (
        <Notice tone="warn" title="The server does not answer.">
          Earlier drafts are missing from this list until it does. What is on this computer is here.
        </Notice>
      )}
      {picked === null ? (
        <EmptyState icon="history" title="No earlier text yet">
          While you write, a text is kept every few minutes, and each time you hand in.
        </EmptyState>
      ) : (
        <div className="history">
          <ul className="history-list" aria-label="Earlier texts, newest first">
            {texts.map((text) => (
              <li key={text.id}>
                <button
                  type="button"
                  className="history-entry"
                  aria-pressed={text === picked}
                  onClick={() => setPickedId(text.id)}
                >
                  <Ribbon ribbon={text.ribbon} label="" size="row" />
                  <span>
                    <b className="text-ink">{text.title}</b> {text.when}
                    {text.by && ` · ${text.by}`}
                  </span>
                </button>
              </li>
            ))}
          </ul>
          <div className="history-compare">
            <Select
              label="Compare with"
              value={other ? otherId : NOW}
              onChange={(event) => setOtherId(event.target.value)}
              options={[
                { value: NOW, label: "The script now" },
                ...texts
                  .filter((text) => text !== picked)
                  .map((text) => ({ value: text.id, label: presentKeptText(text) })),
              ]}
            />
            {isFailed && (
              <Notice tone="stop" role="alert" title="The text could not be read.">
                Choose it again when the server answers.
              </Notice>
            )}
            {!isFailed && (!earlier || !later) && <Skeleton shape="block" className="h-60" />}
            {!isFailed && earlier && later && <ScriptCompareView earlier={earlier} later={later} />}
          </div>
        </div>
      )}
    </Dialog>
  );
}

function restoreReason(picked: KeptText | null, text: string | null, source: string): string | null {
  if (picked === null) return "There is no earlier text yet.";
  if (text === null) return "The text is still being read.";
  return text === source ? "This is what the script says now." : null;
}

interface ReadText {
  readonly source: string | null;
  readonly isFailed: boolean;
}

const UNREAD: ReadText = { source: null, isFailed: false };

/** The text behind an id; null while it is being read. */
function useText(id: string | null, readText: History["readText"]): ReadText {
  const [read, setRead] = useState<ReadText & { readonly id: string | null }>({ ...UNREAD, id: null });
  useEffect(() => {
    if (id === null) return;
    let isGone = false;
    readText(id).then(
      (source) => isGone || setRead({ id, source, isFailed: false }),
      () => isGone || setRead({ id, source: null, isFailed: true }),
    );
    return () => {
      isGone = true;
    };
  }, [id, readText]);
  return read.id === id ? read : UNREAD;
}
