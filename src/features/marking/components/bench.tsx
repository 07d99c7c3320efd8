import { useState, type ReactNode } from "react";
import type { RibbonPicture } from "../../../../shared/contracts/common.ts";
import type { CommentAnchor, SubmissionDetail } from "../../../../shared/contracts/marking.ts";
import type { BeatMap } from "../../../../shared/contracts/songs.ts";
import type { Timeline } from "../../../../sandbox/timeline/model.ts";
import { Button } from "../../../components/button.tsx";
import { FindingList } from "../../../components/finding-list.tsx";
import { Notice } from "../../../components/notice.tsx";
import { Sentence } from "../../../components/sentence.tsx";
import { presentLength } from "../../../lib/zoned-time.ts";
import { type PlacedComment, placeComments, presentAnchor, presentMoment } from "../model/comment-place.ts";
import type { DeskPlayback } from "../playback.ts";
import { toDraftKey, type useComments } from "../use-comments.ts";
import { CommentComposer } from "./comment-composer.tsx";
import { CommentNote } from "./comment-note.tsx";
import { DeskHead, type DeskHeadProps } from "./desk-head.tsx";
import { MomentsStrip } from "./moments-strip.tsx";

/** What the desk puts into the script. */
export interface ScriptParts {
  readonly notes: ReadonlyMap<number, ReactNode>;
  readonly markedLines: readonly number[];
  readonly onPickLine: (line: number) => void;
}

export interface BenchProps extends Pick<DeskHeadProps, "timeZone" | "now" | "position" | "onPrevious" | "onNext"> {
  detail: SubmissionDetail;
  picture: RibbonPicture | null;
  playback: DeskPlayback | null;
  timeline: Timeline | null;
  song: Pick<BeatMap, "bars"> | null;
  stage: ReactNode;
  transport: ReactNode;
  renderScript: (parts: ScriptParts) => ReactNode;
  onShowLine: (line: number) => void;
  comments: ReturnType<typeof useComments>;
  foot: ReactNode;
}

/** The show on the desk: stage, moments, transport, and the script with the comments below its lines. */
export function Bench({
  detail,
  picture,
  playback,
  timeline,
  song,
  stage,
  transport,
  renderScript,
  onShowLine,
  comments,
  foot,
  ...head
}: BenchProps) {
  const { submission, run } = detail;
  const [hereId, setHereId] = useState<string | null>(null);
  const bars = song ?? { bars: [] };
  const placed = placeComments(detail.comments, timeline, bars);
  const { open } = comments;

  const composer = open && (
    <CommentComposer
      key={open.idempotencyKey}
      place={presentAnchor(open.anchor, bars)}
      draftKey={toDraftKey(submission.id, open.anchor)}
      isPending={comments.isPending}
      error={comments.error}
      onSave={comments.save}
      onCancel={comments.close}
    />
  );
  const composerLine = open && lineOf(open.anchor);
  const noteOf = (one: PlacedComment) => (
    <CommentNote
      key={one.comment.id}
      placed={one}
      isHere={one.comment.id === hereId}
      onDelete={() => comments.takeBack(one.comment)}
    />
  );
  const lines = new Set([
    ...placed.flatMap((one) => (one.line === null ? [] : [one.line])),
    ...(composerLine ? [composerLine] : []),
  ]);
  const notes = new Map(
    [...lines].map((line) => [
      line,
      <div key={line} className="my-1 mr-3 ml-12 space-y-1.5 max-wide:ml-9">
        {placed.filter((one) => one.line === line).map(noteOf)}
        {composerLine === line && composer}
      </div>,
    ]),
  );

  const select = (one: PlacedComment) => {
    setHereId(one.comment.id);
    if (one.tick !== null) playback?.seekTick(one.tick);
    if (one.line !== null) onShowLine(one.line);
  };
  const elsewhere = placed.filter((one) => one.line === null);
  return (
    <section aria-label="Show" className="flex min-h-0 min-w-0 flex-col bg-well">
      <DeskHead submission={submission} {...head} />
      {stage}
      <MomentsStrip
        picture={picture}
        label={`Ribbon of ${submission.showTitle}, ${presentLength(run.seconds)}: ${run.description}`}
        comments={placed}
        playback={playback}
        hereId={hereId}
        onSelect={select}
      />
      {transport}
      <div
        role="region"
        aria-label="Script and comments"
        className="min-h-0 flex-1 overflow-y-auto bg-card py-1.5 [scrollbar-width:thin]"
      >
        <RunNotices detail={detail} onShowLine={onShowLine} />
        {composerLine === null && composer && <div className="mx-3 mb-2">{composer}</div>}
        {renderScript({
          notes,
          markedLines: run.problem ? [run.problem.range.line] : [],
          onPickLine: (line) => comments.write({ kind: "lines", from: line, to: line }),
        })}
        <div className="mx-3 mt-3 space-y-1.5">
          {elsewhere.map(noteOf)}
          <Button size="small" look="quiet" icon="note" onPress={() => comments.write({ kind: "whole" })}>
            Comment on the whole show
          </Button>
        </div>
        {run.isOk && (
          <details
            className="mx-3 mt-3 border-t border-line pt-2"
            open={run.findings.some((finding) => finding.severity === "stop")}
          >
            <summary className="min-h-7 cursor-pointer font-bold">Show check: {presentCount(run.findings)}</summary>
            <FindingList
              findings={run.findings}
              presentMoment={(tick) => presentMoment(tick, bars)}
              onShowMoment={(tick) => playback?.seekTick(tick)}
              onShowLine={onShowLine}
            />
          </details>
        )}
      </div>
      {foot}
    </section>
  );
}

function lineOf(anchor: CommentAnchor): number | null {
  return anchor.kind === "lines" ? anchor.to : null;
}

function presentCount(findings: SubmissionDetail["run"]["findings"]): string {
  const count = (severity: string) => findings.filter((finding) => finding.severity === severity).length;
  const stops = count("stop");
  const warns = count("warn");
  if (stops + warns === 0) return "nothing to mend";
  return [stops > 0 && (stops === 1 ? "1 stop" : `${stops} stops`), warns > 0 && `${warns} to look at`]
    .filter(Boolean)
    .join(", ");
}

/** What the teacher must know before marking: it did not run, or not as it did in the student's browser. */
function RunNotices({ detail, onShowLine }: { detail: SubmissionDetail; onShowLine: (line: number) => void }) {
  const { run, submission } = detail;
  return (
    <>
      {!run.isOk && (
        <div className="mx-3 mb-2">
          <Notice
            tone="warn"
            title="This script does not run."
            actions={
              run.problem && (
                <Button size="small" onPress={() => run.problem && onShowLine(run.problem.range.line)}>
                  Show line {run.problem.range.line}
                </Button>
              )
            }
          >
            <Sentence text={run.problem ? `${run.problem.sentence} ${run.problem.hint}` : run.description} />
          </Notice>
        </div>
      )}
      {submission.hashesAgree === false && (
        <div className="mx-3 mb-2">
          <Notice title="The server’s run came out different from the student’s screen.">
            What you see is the server’s run, and it is the one that counts.
          </Notice>
        </div>
      )}
    </>
  );
}
