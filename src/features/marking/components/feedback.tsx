import { useState, type FormEvent } from "react";
import { Link } from "react-router";
import type { Comment, SubmissionDetail } from "../../../../shared/contracts/marking.ts";
import { Button } from "../../../components/button.tsx";
import { Card } from "../../../components/card.tsx";
import { Notice } from "../../../components/notice.tsx";
import { TextArea } from "../../../components/text-area.tsx";
import { HERE } from "../../../lib/format.ts";
import { presentWhen } from "../../../lib/zoned-time.ts";
import { useNow } from "../../../hooks/use-now.ts";
import { useComment } from "../api.ts";

export interface FeedbackProps {
  detail: SubmissionDetail;
}

/** What came back from the teacher, as the pupil reads it: mark, note, comments by line, and a way to answer. */
export function Feedback({ detail }: FeedbackProps) {
  const { submission, mark, comments, rubric } = detail;
  const now = useNow();
  const sentBack = detail.history.filter((event) => event.state === "revise").length;
  return (
    <section aria-labelledby="feedback" className="space-y-4">
      <h2 id="feedback">What came back</h2>
      {submission.state === "submitted" && comments.length === 0 && (
        <Notice tone="info" title={`Version ${submission.versionNumber} is with your teacher.`}>
          You can still change it and hand in again.
        </Notice>
      )}
      {submission.state === "revise" && (
        <Notice
          tone="warn"
          icon="turn"
          title={sentBack > 1 ? "Sent back for another pass." : "Your teacher sent it back for another pass."}
        >
          Read the comments, mend the script in the studio, then hand it in again.
        </Notice>
      )}
      {submission.hashesAgree === false && (
        <Notice tone="info" title="The server's run came out different from your screen's.">
          The server's run counts. Your script is exactly as you wrote it.
        </Notice>
      )}
      {mark?.isReleased && (
        <Card isPadded>
          <p className="font-head text-6 font-semibold">
            {mark.got} of {mark.of} points
          </p>
          <ul className="mt-2 space-y-1">
            {rubric.map((criterion) => {
              const level = mark.levels[criterion.id];
              const chosen = level === undefined ? undefined : criterion.levels[level - 1];
              return (
                <li key={criterion.id}>
                  <span className="font-semibold">{criterion.name}:</span>{" "}
                  {chosen ? `${chosen.name}. ${chosen.text}` : "not marked"}
                </li>
              );
            })}
          </ul>
          {mark.note !== "" && (
            <p className="mt-3 max-w-[62ch] whitespace-pre-line border-l-4 border-blue-ink bg-blue-tint px-4 py-3">
              {mark.note}
            </p>
          )}
        </Card>
      )}
      {comments.length > 0 && (
        <ol className="space-y-3">
          {comments.map((comment) => (
            <li
              key={comment.id}
              className={`max-w-[72ch] border-l-4 px-4 py-3 ${comment.isTeacher ? "border-blue-ink bg-blue-tint" : "border-rim bg-well"}`}
            >
              <p>
                <span className="font-semibold">{comment.isMine ? "You" : comment.authorName}</span>{" "}
                <span className="text-soft">
                  <Anchor comment={comment} showId={submission.showId} /> · version {comment.versionNumber} ·{" "}
                  {presentWhen(comment.createdAt, now, HERE)}
                </span>
              </p>
              <p className="whitespace-pre-line">{comment.body}</p>
            </li>
          ))}
        </ol>
      )}
      <Answer submissionId={submission.id} />
    </section>
  );
}

function Anchor({ comment, showId }: { comment: Comment; showId: string }) {
  const { anchor } = comment;
  if (anchor.kind === "whole") return <>on the whole show</>;
  if (anchor.kind === "moment") return <Link to={`/shows/${showId}?at=${anchor.tick}`}>on a moment</Link>;
  const words = anchor.from === anchor.to ? `line ${anchor.from}` : `lines ${anchor.from} to ${anchor.to}`;
  return <Link to={`/shows/${showId}?line=${anchor.from}`}>{words}</Link>;
}

function Answer({ submissionId }: { submissionId: SubmissionDetail["submission"]["id"] }) {
  const [body, setBody] = useState("");
  const [key, setKey] = useState(() => crypto.randomUUID());
  const send = useComment(submissionId);

  const handleSubmit = (event: FormEvent) => {
    event.preventDefault();
    if (body.trim() === "") return;
    send.mutate(
      { anchor: { kind: "whole" }, body, idempotencyKey: key },
      {
        onSuccess: () => {
          setBody("");
          setKey(crypto.randomUUID());
        },
      },
    );
  };

  return (
    <form onSubmit={handleSubmit} className="max-w-[72ch] space-y-2">
      <TextArea
        label="Answer your teacher"
        rows={2}
        value={body}
        onChange={(event) => setBody(event.target.value)}
        error={send.error ? `${send.error.message} Your answer is still here; try again.` : null}
      />
      <Button
        type="submit"
        icon="send"
        isPending={send.isPending}
        disabledReason={body.trim() === "" ? "Write an answer first." : null}
      >
        Send
      </Button>
    </form>
  );
}
