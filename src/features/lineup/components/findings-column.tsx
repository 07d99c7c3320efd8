import type { ReactNode } from "react";
import type { Lineup, LineupFinding } from "../../../../shared/contracts/lineup.ts";
import type { ForwardId, SlotId } from "../../../../shared/ids.ts";
import { Button } from "../../../components/button.tsx";
import { Icon, type IconName } from "../../../components/icon.tsx";
import { PlaceButton } from "../../../components/place-button.tsx";
import { presentDate } from "../../../lib/zoned-time.ts";
import { listFindings, listShares } from "../model/board.ts";
import { findSlot } from "../model/change.ts";

export interface FindingsColumnProps {
  lineup: Lineup;
  /** Why it cannot be published, or that it can. */
  status: string;
  statusId: string;
  onFix: (fix: NonNullable<LineupFinding["fix"]>) => void;
  onShowSlot: (slotId: SlotId) => void;
  onPlace: (forwardId: ForwardId) => void;
}

const SIGNS: Record<LineupFinding["severity"], { icon: IconName; ink: string; word: string }> = {
  stop: { icon: "stop", ink: "text-rowan", word: "Stop" },
  warn: { icon: "warn", ink: "text-lamp-ink", word: "Look here" },
  note: { icon: "info", ink: "text-blue-ink", word: "Note" },
};

/** What stands in the way of publishing, each with its smallest fix; and how the stage is shared. */
export function FindingsColumn({ lineup, status, statusId, onFix, onShowSlot, onPlace }: FindingsColumnProps) {
  const findings = listFindings(lineup).filter((finding) => finding.rule !== "not-placed");
  const firstStop = findings.findIndex((finding) => finding.severity === "stop" && finding.fix !== null);
  return (
    <section
      aria-labelledby="findings-heading"
      className="min-h-0 overflow-y-auto border-line bg-card [scrollbar-width:thin] max-wide:border-t wide:border-l"
    >
      <div className="border-b border-line px-3 py-2.5">
        <h2 id="findings-heading">Before you publish</h2>
        <p id={statusId} className="text-meta text-slate">
          {status}
        </p>
      </div>
      {findings.length === 0 ? (
        <p className="flex items-center gap-2 border-b border-line px-3 py-3">
          <Icon name="tick" className="size-5 text-spruce" />
          The plan has nothing to clear.
        </p>
      ) : (
        <ul className="divide-y divide-line border-b border-line">
          {findings.map((finding, index) => {
            const sign = SIGNS[finding.severity];
            return (
              <li key={`${finding.rule} ${finding.slotId} ${finding.sentence}`} className="px-3 pt-2 pb-2.5">
                <h3 className="flex gap-1.5 font-text text-body leading-[1.3] font-bold tracking-normal">
                  <Icon name={sign.icon} label={sign.word} className={`mt-0.5 size-[1.15em] ${sign.ink}`} />
                  <FindingTitle lineup={lineup} finding={finding} onShowSlot={onShowSlot} />
                </h3>
                <p className="mt-0.5 pl-6 text-soft">{finding.sentence}</p>
                {finding.fix && (
                  <Button
                    size="small"
                    look={index === firstStop ? "main" : "plain"}
                    className="mt-1.5 ml-6 max-w-[calc(100%-1.5rem)] py-1! whitespace-normal!"
                    onPress={() => finding.fix && onFix(finding.fix)}
                  >
                    {finding.fix.label}
                  </Button>
                )}
              </li>
            );
          })}
        </ul>
      )}
      <StageShare lineup={lineup} onPlace={onPlace} />
      <p className="px-3 pb-3 text-meta text-slate">
        The plan is checked for times, nights and the show check of each show. It is a planning aid: local codes, the
        venue’s safety officer and a licensed electrician decide.
      </p>
    </section>
  );
}

function FindingTitle({
  lineup,
  finding,
  onShowSlot,
}: {
  lineup: Lineup;
  finding: LineupFinding;
  onShowSlot: (slotId: SlotId) => void;
}): ReactNode {
  const slot = finding.slotId && findSlot(lineup, finding.slotId);
  const night = slot && lineup.nights.find((candidate) => candidate.id === slot.nightId);
  if (!slot || !night) return finding.cause;
  return (
    <span>
      <PlaceButton onPress={() => onShowSlot(slot.id)}>
        {presentDate(night.date, "column")}, {slot.startsAt}
      </PlaceButton>
      {finding.cause}
    </span>
  );
}

function StageShare({ lineup, onPlace }: Pick<FindingsColumnProps, "lineup" | "onPlace">) {
  const shares = listShares(lineup);
  const waiting = lineup.shows.filter((show) => !lineup.slots.some((slot) => slot.forwardId === show.id));
  if (shares.length === 0) return null;
  return (
    <div className="px-3 pt-2 pb-3">
      <h3>Share of the stage</h3>
      <dl className="mt-1.5 space-y-2 text-meta">
        {shares.map((share) => (
          <div key={share.schoolName} className="grid grid-cols-[1fr_auto] gap-x-2 gap-y-0.5">
            <dt>{share.schoolName}</dt>
            <dd className="tabular-nums">
              {share.showCount === 1 ? "1 show" : `${share.showCount} shows`},{" "}
              {share.slotCount === 1 ? "1 slot" : `${share.slotCount} slots`}
            </dd>
            <dd aria-hidden="true" className="col-span-2 h-2.5 border border-rim bg-well">
              <span className="block h-full bg-blue-ink" style={{ width: `${share.share * 100}%` }} />
            </dd>
          </div>
        ))}
      </dl>
      {waiting.length > 0 && (
        <p className="mt-2 text-meta text-slate">
          {waiting.length === 1
            ? "1 approved show has no night yet: "
            : `${waiting.length} approved shows have no night yet: `}
          {waiting.map((show) => (
            <PlaceButton key={show.id} onPress={() => onPlace(show.id)}>
              {show.title}
            </PlaceButton>
          ))}
        </p>
      )}
    </div>
  );
}
