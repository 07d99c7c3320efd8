import type { ReactNode } from "react";
import type { ForwardSummary } from "../../../../shared/contracts/lineup.ts";
import { ListRow } from "../../../components/list.tsx";
import { PictureRibbon } from "../../../components/picture-ribbon.tsx";
import { Tag } from "../../../components/tag.tsx";
import { formatNames } from "../../../lib/format.ts";
import { presentLength, presentWhen } from "../../../lib/zoned-time.ts";

export interface ForwardRowProps {
  forward: ForwardSummary;
  to: string;
  timeZone: string;
  now: number;
  /** Below the line: the teacher's note, the coordinator's answer. */
  words?: ReactNode;
  actions?: ReactNode;
}

/** One forwarded show in a list. */
export function ForwardRow({ forward, to, timeZone, now, words, actions }: ForwardRowProps) {
  return (
    <ListRow
      level={2}
      className="px-4"
      title={forward.title}
      to={to}
      line={
        <>
          {presentMakers(forward)}, {forward.className}, {forward.schoolName} · {forward.songTitle},{" "}
          {presentLength(forward.seconds)} · forwarded {presentWhen(forward.forwardedAt, now, timeZone)}
        </>
      }
      ribbon={
        <>
          <PictureRibbon picture={forward.ribbon} size="row" label="" className="max-w-xl" />
          {words}
        </>
      }
      tag={
        <span className="flex flex-wrap gap-1.5">
          {forward.stopCount > 0 && (
            <Tag state="stop">{forward.stopCount === 1 ? "1 stop" : `${forward.stopCount} stops`}</Tag>
          )}
          {forward.stopCount === 0 && forward.warnCount > 0 && <Tag state="warn">{forward.warnCount} to look at</Tag>}
          <Tag state={forward.state}>
            {forward.state === "scheduled"
              ? forward.slotCount === 1
                ? "On 1 slot"
                : `On ${forward.slotCount} slots`
              : undefined}
          </Tag>
        </span>
      }
      actions={actions}
    />
  );
}

/** Who made a show: by name where the reader may know it, else as the programme says it. */
export function presentMakers({ authors, publicName }: ForwardSummary): string {
  return authors.length > 0 ? formatNames(authors) : publicName;
}

/** Words of a person under a row: who said it, and what. */
export function Words({ by, children }: { by: string; children: string }) {
  if (children === "") return null;
  return (
    <p className="mt-1.5 max-w-[72ch] whitespace-pre-line text-soft">
      <b className="font-semibold">{by}:</b> {children}
    </p>
  );
}
