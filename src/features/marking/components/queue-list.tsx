import { useEffect, useRef } from "react";
import { Link } from "react-router";
import type { QueueRow } from "../../../../shared/contracts/marking.ts";
import { Icon, type IconName } from "../../../components/icon.tsx";
import { PictureRibbon } from "../../../components/picture-ribbon.tsx";
import { presentWhen } from "../../../lib/zoned-time.ts";

export interface QueueListProps {
  rows: readonly QueueRow[];
  hereId: string;
  timeZone: string;
  now: number;
  toRow: (submissionId: string) => string;
}

/** What was handed in for one assignment, to mark first; the one on the desk is marked. */
export function QueueList({ rows, hereId, timeZone, now, toRow }: QueueListProps) {
  const hereRef = useRef<HTMLAnchorElement>(null);
  // Keys can go past the part in sight.
  useEffect(() => {
    hereRef.current?.scrollIntoView({ block: "nearest" });
  }, [hereId]);
  return (
    <ol>
      {rows.map((row) => {
        const isHere = row.submissionId === hereId;
        const status = presentRow(row, now, timeZone);
        return (
          <li key={row.submissionId} className="border-b border-line">
            <Link
              ref={isHere ? hereRef : undefined}
              to={toRow(row.submissionId)}
              aria-current={isHere ? "true" : undefined}
              className="grid grid-cols-[minmax(0,1fr)_auto] gap-x-1.5 gap-y-1 px-3 pt-1.5 pb-2 leading-tight text-ink no-underline -outline-offset-3! hover:bg-well aria-[current]:bg-blue-tint aria-[current]:shadow-[inset_4px_0_0_var(--color-blue-ink)]"
            >
              <span className="truncate font-[650]">{row.authors.join(", ")}</span>
              <span className="flex items-center gap-1 text-meta text-slate">
                <Icon name={status.icon} className="size-[1.1em]" />
                {status.text}
                {status.state && <span className="sr-only"> {status.state}</span>}
              </span>
              <span className="col-span-2">
                <PictureRibbon picture={row.ribbon} size="queue" label="" />
              </span>
            </Link>
          </li>
        );
      })}
    </ol>
  );
}

function presentRow(
  row: QueueRow,
  now: number,
  timeZone: string,
): { icon: IconName; text: string; state: string | null } {
  if (row.state === "marked")
    return {
      icon: "tick",
      text: row.points ? `${row.points.got} of ${row.points.of}` : "marked",
      state: row.points ? "marked" : null,
    };
  if (row.state === "revise") return { icon: "turn", text: "sent back", state: null };
  if (!row.isOk) return { icon: "warn", text: "does not run", state: "submitted" };
  if (row.isLate) return { icon: "clock", text: "late", state: "submitted" };
  const when = presentWhen(row.handedInAt, now, timeZone);
  return { icon: "sent", text: when.startsWith("today") ? when : (when.split(" ")[0] ?? when), state: "submitted" };
}
