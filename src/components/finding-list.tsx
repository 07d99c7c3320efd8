import type { z } from "zod";
import type { FindingSchema } from "../../shared/contracts/common.ts";
import { Icon, type IconName } from "./icon.tsx";
import { PlaceButton } from "./place-button.tsx";
import { Sentence } from "./sentence.tsx";

export type FindingOnPage = z.infer<typeof FindingSchema>;

export interface FindingListProps {
  findings: readonly FindingOnPage[];
  /** "bar 21" of a tick. */
  presentMoment: (tick: number) => string;
  onShowMoment: (tick: number) => void;
  /** Left out where no script is on the page: lines are named then, and lead nowhere. */
  onShowLine?: (line: number) => void;
}

const SIGNS: Record<FindingOnPage["severity"], { icon: IconName; ink: string; word: string }> = {
  stop: { icon: "stop", ink: "text-rowan", word: "Stop" },
  warn: { icon: "warn", ink: "text-lamp-ink", word: "Look here" },
  note: { icon: "info", ink: "text-blue-ink", word: "Note" },
};
const RANK = { stop: 0, warn: 1, note: 2 };
const MAX_PLACES = 4;

/** What the show check found, worst first, each with where it can be seen; and the caution that goes with every check. */
export function FindingList({ findings, presentMoment, onShowMoment, onShowLine }: FindingListProps) {
  const order = [...findings].sort((a, b) => RANK[a.severity] - RANK[b.severity]);
  return (
    <div>
      {order.length === 0 ? (
        <p className="flex items-center gap-2">
          <Icon name="tick" className="size-5 text-spruce" />
          The show check found nothing to mend.
        </p>
      ) : (
        <ul className="divide-y divide-line">
          {order.map((finding) => {
            const sign = SIGNS[finding.severity];
            return (
              <li key={`${finding.rule} ${finding.sentence}`} className="grid grid-cols-[20px_1fr] gap-x-2 py-2">
                <Icon name={sign.icon} label={sign.word} className={`mt-0.5 size-[1.15em] ${sign.ink}`} />
                <div className="min-w-0">
                  <p>
                    <Sentence text={finding.sentence} />
                  </p>
                  {finding.hint && (
                    <p className="text-slate">
                      <Sentence text={finding.hint} />
                    </p>
                  )}
                  <p className="flex flex-wrap gap-x-3 text-meta">
                    {finding.moments.slice(0, MAX_PLACES).map((tick) => (
                      <PlaceButton key={`moment-${tick}`} onPress={() => onShowMoment(tick)}>
                        {presentMoment(tick)}
                      </PlaceButton>
                    ))}
                    {finding.lines.slice(0, MAX_PLACES).map((line) =>
                      onShowLine ? (
                        <PlaceButton key={`line-${line}`} onPress={() => onShowLine(line)}>
                          line {line}
                        </PlaceButton>
                      ) : (
                        <span key={`line-${line}`} className="inline-flex min-h-6 items-center text-slate">
                          line {line}
                        </span>
                      ),
                    )}
                  </p>
                </div>
              </li>
            );
          })}
        </ul>
      )}
      <p className="mt-2 text-meta text-slate">
        A planning aid, worked out from the script and the plan of the square: local codes, the venue’s safety officer
        and a licensed electrician decide. Flashing light can harm people with photosensitive epilepsy.
      </p>
    </div>
  );
}
