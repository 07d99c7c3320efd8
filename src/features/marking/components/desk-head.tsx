import type { SubmissionDetail } from "../../../../shared/contracts/marking.ts";
import { IconButton } from "../../../components/icon-button.tsx";
import { Tag } from "../../../components/tag.tsx";
import { Tooltip } from "../../../components/tooltip.tsx";
import { presentWhen } from "../../../lib/zoned-time.ts";
import { formatNames } from "../../../lib/format.ts";

export interface DeskHeadProps {
  submission: SubmissionDetail["submission"];
  timeZone: string;
  now: number;
  /** "2 of 6" */
  position: string;
  onPrevious: (() => void) | null;
  onNext: (() => void) | null;
}

/** Title, authors, version and state of the show on the desk, and the way along the queue. */
export function DeskHead({ submission, timeZone, now, position, onPrevious, onNext }: DeskHeadProps) {
  return (
    <div className="flex items-center gap-x-3 max-wide:flex-wrap gap-y-1 border-b border-line bg-card px-4 py-2 max-wide:gap-x-1.5">
      <Tooltip text="Previous (K)">
        <IconButton
          icon="chevron-left"
          label="Previous in the queue"
          disabledReason={onPrevious ? null : "This is the first."}
          onPress={() => onPrevious?.()}
        />
      </Tooltip>
      <h1 tabIndex={-1} className="max-w-[50%] shrink-0 truncate py-0.5 text-5 max-wide:max-w-[60%] max-wide:text-4">
        {submission.showTitle}
      </h1>
      <p className="min-w-0 truncate text-slate max-wide:order-5 max-wide:w-full">
        {formatNames(submission.authors)} · version {submission.versionNumber},{" "}
        <span className="wide:sr-only">handed in </span>
        {presentWhen(submission.handedInAt, now, timeZone)}
      </p>
      <span className="ml-auto text-meta whitespace-nowrap text-slate wide:hidden">{position}</span>
      <span className="flex gap-2 max-wide:order-6 wide:ml-auto">
        {submission.isLate && (
          <Tag state="plain" icon="clock">
            Late
          </Tag>
        )}
        <Tag state={submission.state} />
      </span>
      <Tooltip text="Next (J)">
        <IconButton
          icon="chevron-right"
          label="Next in the queue"
          disabledReason={onNext ? null : "This is the last."}
          onPress={() => onNext?.()}
        />
      </Tooltip>
    </div>
  );
}
