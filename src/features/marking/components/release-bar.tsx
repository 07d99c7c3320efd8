import type { ReactNode } from "react";
import type { WorkState } from "../../../../shared/contracts/shows.ts";
import { Button } from "../../../components/button.tsx";
import { joinClasses } from "../../../components/class-names.ts";
import { Icon } from "../../../components/icon.tsx";
import { TextArea } from "../../../components/text-area.tsx";
import { type MarkSave, presentSave } from "../model/mark-draft.ts";
import type { Points } from "../model/rubric.ts";

export interface ReleaseBarProps {
  state: WorkState;
  /** "Wren and Idris". */
  authors: string;
  note: string;
  onNoteChange: (note: string) => void;
  noteError: string | null;
  points: Points;
  save: MarkSave;
  onRetrySave: () => void;
  releaseObstacle: string | null;
  onRelease: () => void;
  onSendBack: () => void;
  onReopen: () => void;
  /** The act under way, if any. */
  pending: "release" | "send-back" | "reopen" | null;
  /** Forwarding: a button with its reason, or the state of the forwarded show. */
  forwarding: ReactNode;
}

/** The foot of the rubric, always in sight: note to the authors, total, send back, release. */
export function ReleaseBar(props: ReleaseBarProps) {
  const isOpen = props.state === "submitted";
  return (
    <div className="border-t border-line bg-card px-4 pt-2.5 pb-3">
      {isOpen ? <OpenMark {...props} /> : <FixedMark {...props} />}
    </div>
  );
}

function OpenMark({
  authors,
  note,
  onNoteChange,
  noteError,
  points,
  save,
  onRetrySave,
  releaseObstacle,
  onRelease,
  onSendBack,
  pending,
  forwarding,
}: ReleaseBarProps) {
  const saved = presentSave(save);
  return (
    <>
      <TextArea
        id="mark-note"
        label={`To ${authors}`}
        rows={2}
        value={note}
        maxLength={2000}
        onChange={(event) => onNoteChange(event.target.value)}
        error={noteError}
        className="[&_textarea]:max-h-32 [&_textarea]:min-h-14"
      />
      <div className="mt-2 flex flex-wrap items-center gap-1.5">
        <strong className="mr-auto font-head text-[1.25rem]/none font-[650] whitespace-nowrap tabular-nums">
          {points.got} of {points.of}
        </strong>
        <Button icon="turn" className="px-2.5!" onPress={onSendBack} isPending={pending === "send-back"}>
          Send back
        </Button>
        <Button
          look="main"
          icon="tick"
          className="px-2.5!"
          onPress={onRelease}
          isPending={pending === "release"}
          disabledReason={releaseObstacle}
        >
          Release mark
        </Button>
      </div>
      <div className="mt-2 flex flex-wrap items-center gap-x-3 gap-y-1 text-meta">
        <p
          role="status"
          className={joinClasses(
            "flex min-h-6 items-center gap-1.5",
            saved.isCareful ? "font-semibold text-lamp-ink" : "text-slate",
          )}
        >
          {saved.isCareful && <Icon name="warn" className="size-4" />}
          {saved.text}
        </p>
        {saved.isCareful && (
          <Button size="small" onPress={onRetrySave}>
            Save now
          </Button>
        )}
        <span className="ml-auto">{forwarding}</span>
      </div>
    </>
  );
}

function FixedMark({ state, authors, note, points, onReopen, pending, forwarding }: ReleaseBarProps) {
  const isMarked = state === "marked";
  return (
    <>
      <h3 className="font-text text-body font-bold tracking-normal">To {authors}</h3>
      <p className="mt-0.5 max-h-28 overflow-y-auto whitespace-pre-wrap text-soft">{note || "No note was written."}</p>
      <div className="mt-2.5 flex flex-wrap items-center gap-2">
        <strong className="mr-auto font-head text-[1.25rem]/none font-[650] whitespace-nowrap tabular-nums">
          {isMarked ? `${points.got} of ${points.of}` : "Sent back"}
        </strong>
        <Button icon="undo" onPress={onReopen} isPending={pending === "reopen"}>
          {isMarked ? "Take the mark back" : "Take it back"}
        </Button>
      </div>
      <div className="mt-2 flex flex-wrap items-center gap-x-3 gap-y-1 text-meta text-slate">
        <p>{isMarked ? "Released: the authors see mark and note." : "The authors work on it again."}</p>
        <span className="ml-auto">{forwarding}</span>
      </div>
    </>
  );
}
