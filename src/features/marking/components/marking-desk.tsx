import { useEffect, useState, type ReactNode } from "react";
import type { QueueRow, SubmissionDetail } from "../../../../shared/contracts/marking.ts";
import type { BeatMap } from "../../../../shared/contracts/songs.ts";
import type { Timeline } from "../../../../sandbox/timeline/model.ts";
import { Button } from "../../../components/button.tsx";
import { KeyHints } from "../../../components/kbd.tsx";
import { showToast } from "../../../components/toast-queue.ts";
import { formatNames } from "../../../lib/format.ts";
import type { DeskAction } from "../model/desk-keys.ts";
import { presentMoment } from "../model/comment-place.ts";
import { findNeighbour, findNextToMark, presentQueue } from "../model/queue.ts";
import { countPoints, findCurrent, findReleaseObstacle, pressLevel } from "../model/rubric.ts";
import type { DeskPlayback } from "../playback.ts";
import { useComments } from "../use-comments.ts";
import { useDeskKeys } from "../use-desk-keys.ts";
import { useMarkActs } from "../use-mark-acts.ts";
import { useMarkDraft } from "../use-mark-draft.ts";
import { Bench, type ScriptParts } from "./bench.tsx";
import { KeysDialog } from "./keys-dialog.tsx";
import { QueueList } from "./queue-list.tsx";
import { ReleaseBar } from "./release-bar.tsx";
import { RubricPanel } from "./rubric-panel.tsx";
import { SendBackDialog } from "./send-back-dialog.tsx";

export interface MarkingDeskProps {
  queue: { title: string; className: string; rows: readonly QueueRow[] };
  detail: SubmissionDetail;
  timeZone: string;
  now: number;
  /** Null when there is nothing to play. */
  playback: DeskPlayback | null;
  timeline: Timeline | null;
  song: Pick<BeatMap, "bars"> | null;
  stage: ReactNode;
  transport: ReactNode;
  renderScript: (parts: ScriptParts) => ReactNode;
  onShowLine: (line: number) => void;
  /** Forward to the event, or what became of it. */
  forwarding: ReactNode;
  toRow: (submissionId: string) => string;
  onGo: (submissionId: QueueRow["submissionId"]) => void;
}

const HINTS = [
  { keys: ["J", "K"], does: "next, previous" },
  { keys: ["1–4"], does: "level" },
  { keys: ["C"], does: "comment here" },
  { keys: ["Space"], does: "play" },
  { keys: ["G"], does: "release" },
];

/** Everything for one mark on one screen: queue, show with script and comments, rubric with evidence. */
export function MarkingDesk({
  queue,
  detail,
  timeZone,
  now,
  playback,
  timeline,
  song,
  stage,
  transport,
  renderScript,
  onShowLine,
  forwarding,
  toRow,
  onGo,
}: MarkingDeskProps) {
  const { submission, rubric } = detail;
  const draft = useMarkDraft(submission.id, detail.mark);
  const comments = useComments(submission.id);
  const [currentId, setCurrentId] = useState(() => findCurrent(rubric, draft.text.levels));
  const [dialog, setDialog] = useState<"keys" | "send-back" | null>(null);
  const isOpen = submission.state === "submitted";
  const obstacle = findReleaseObstacle(rubric, draft.text.levels);
  const previous = findNeighbour(queue.rows, submission.id, -1);
  const acts = useMarkActs({
    submission,
    draft,
    onOpen: onGo,
    onDone: () => {
      const following = findNextToMark(queue.rows, submission.id);
      if (following) onGo(following.submissionId);
    },
  });

  const next =
    (acts.hasReleased && !isOpen ? findNextToMark(queue.rows, submission.id) : null) ??
    findNeighbour(queue.rows, submission.id, 1);

  const showCriterion = (id: string | null) => {
    setCurrentId(id);
    document.querySelector(`[data-criterion="${id ?? ""}"]`)?.scrollIntoView({ block: "nearest" });
  };
  const handleAction = (action: DeskAction) => {
    if (action.kind === "next" && next) onGo(next.submissionId);
    if (action.kind === "previous" && previous) onGo(previous.submissionId);
    if (action.kind === "play") playback?.toggle();
    if (action.kind === "comment")
      comments.write(playback ? { kind: "moment", tick: Math.round(playback.getTick()) } : { kind: "whole" });
    if (action.kind === "keys") setDialog("keys");
    if (action.kind === "release" && isOpen) {
      if (obstacle === null) void acts.release();
      else {
        showToast({ title: "The mark is not released yet.", detail: obstacle });
        showCriterion(findCurrent(rubric, draft.text.levels));
      }
    }
    if (action.kind === "level" && isOpen && currentId !== null) {
      const after = pressLevel(rubric, { levels: draft.text.levels, currentId }, action.level);
      draft.setLevel(currentId, action.level);
      showCriterion(after.currentId);
    }
  };
  useDeskKeys(handleAction);
  useEffect(() => {
    // At the end of the window lies the release bar of the next show: messages go to the other side.
    document.documentElement.dataset.toastSide = "start";
    return () => {
      delete document.documentElement.dataset.toastSide;
    };
  }, []);

  const position = queue.rows.findIndex((row) => row.submissionId === submission.id) + 1;
  const presentTick = (tick: number) => (song ? presentMoment(tick, song) : "there");
  return (
    <div className="grid flex-1 grid-cols-[222px_minmax(0,1fr)_396px] bg-card wide:h-[calc(100dvh-var(--band))] wide:flex-none wide:pt-1.5 max-wide:grid-cols-1">
      <aside aria-label="Queue" className="flex min-h-0 flex-col border-r border-line max-wide:hidden">
        <div className="border-b border-line px-3 py-2.5">
          <h2 className="text-3">{queue.title}</h2>
          <p className="text-meta text-slate">
            {queue.className} · {presentQueue(queue.rows)}
          </p>
        </div>
        <div className="min-h-0 flex-1 overflow-y-auto [scrollbar-width:thin]">
          <QueueList rows={queue.rows} hereId={submission.id} timeZone={timeZone} now={now} toRow={toRow} />
        </div>
      </aside>
      <Bench
        detail={detail}
        timeZone={timeZone}
        now={now}
        position={`${position} of ${queue.rows.length}`}
        picture={queue.rows[position - 1]?.ribbon ?? null}
        playback={playback}
        timeline={timeline}
        song={song}
        stage={stage}
        transport={transport}
        renderScript={renderScript}
        onShowLine={onShowLine}
        comments={comments}
        onPrevious={previous && (() => onGo(previous.submissionId))}
        onNext={next && (() => onGo(next.submissionId))}
        foot={
          <div className="flex flex-wrap items-center gap-x-4 border-t border-line bg-card px-4 py-1.5 max-wide:hidden">
            <KeyHints hints={HINTS} />
            <Button size="small" look="quiet" icon="keyboard" onPress={() => setDialog("keys")}>
              All keys
            </Button>
          </div>
        }
      />
      <section aria-label="Rubric" className="flex min-h-0 flex-col border-line bg-paper wide:border-l">
        <div className="min-h-0 flex-1 overflow-y-auto [scrollbar-width:thin]">
          <RubricPanel
            rubric={rubric}
            levels={draft.text.levels}
            evidence={detail.evidence}
            currentId={currentId}
            onCurrentChange={setCurrentId}
            onLevelChange={draft.setLevel}
            isFixed={!isOpen}
            presentMoment={presentTick}
            onShowLine={onShowLine}
            onShowMoment={(tick) => playback?.seekTick(tick)}
          />
        </div>
        <ReleaseBar
          state={submission.state}
          authors={formatNames(submission.authors)}
          note={draft.text.note}
          onNoteChange={draft.setNote}
          noteError={null}
          points={countPoints(rubric, draft.text.levels)}
          save={draft.save}
          onRetrySave={() => void draft.flush()}
          releaseObstacle={obstacle}
          onRelease={() => void acts.release()}
          onSendBack={() => setDialog("send-back")}
          onReopen={acts.takeBack}
          pending={acts.isReleasing ? "release" : acts.isSendingBack ? "send-back" : acts.isReopening ? "reopen" : null}
          forwarding={forwarding}
        />
      </section>
      <KeysDialog isOpen={dialog === "keys"} onClose={() => setDialog(null)} />
      <SendBackDialog
        isOpen={dialog === "send-back"}
        authors={formatNames(submission.authors)}
        note={draft.text.note}
        isPending={acts.isSendingBack}
        error={acts.sendBackError}
        onClose={() => setDialog(null)}
        onSend={(note) => acts.sendBack(note, () => setDialog(null))}
      />
    </div>
  );
}
