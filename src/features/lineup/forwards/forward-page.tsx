import type { ReactNode } from "react";
import type { z } from "zod";
import type { RunSummary } from "../../../../shared/contracts/common.ts";
import type { ForwardSummary, lineupContract } from "../../../../shared/contracts/lineup.ts";
import { Card, CardHeader } from "../../../components/card.tsx";
import { FindingList } from "../../../components/finding-list.tsx";
import { Icon } from "../../../components/icon.tsx";
import { LinkButton } from "../../../components/link-button.tsx";
import { Notice } from "../../../components/notice.tsx";
import { SubBand } from "../../../components/sub-band.tsx";
import { Tag } from "../../../components/tag.tsx";
import { presentLength, presentWhen } from "../../../lib/zoned-time.ts";
import { presentMakers, Words } from "./forward-row.tsx";

export type ForwardDetail = z.output<(typeof lineupContract)["forwardDetail"]["response"]>;

export interface ForwardPageProps {
  detail: ForwardDetail;
  back: { to: string; label: string };
  timeZone: string;
  now: number;
  /** Stage, ribbon and transport. */
  show: ReactNode;
  presentMoment: (tick: number) => string;
  onShowMoment: (tick: number) => void;
  /** The coordinator's answer, or the way on for the teacher. */
  answer: ReactNode;
}

/** A forwarded show: watch it, read what the check on the real square found, and what the people said. */
export function ForwardPage({
  detail,
  back,
  timeZone,
  now,
  show,
  presentMoment,
  onShowMoment,
  answer,
}: ForwardPageProps) {
  const { forward, run, findings } = detail;
  return (
    <>
      <SubBand
        title={forward.title}
        detail={`${presentMakers(forward)}, ${forward.className}, ${forward.schoolName}`}
        actions={
          <LinkButton to={back.to} look="quiet" icon="arrow-left">
            {back.label}
          </LinkButton>
        }
      >
        <Tag state={forward.state} />
      </SubBand>
      <div className="grid grid-cols-[minmax(0,1fr)_396px] items-start gap-4 px-6 py-4 max-wide:grid-cols-1 max-wide:px-4">
        <div className="min-w-0 space-y-4">
          <div className="overflow-hidden rounded-sheet">{show}</div>
          <p className="max-w-[72ch] text-soft">{run.description}</p>
        </div>
        <div className="min-w-0 space-y-4">
          <Card as="section" aria-labelledby="answer-heading">
            <CardHeader title="Answer" titleId="answer-heading" />
            <div className="p-4">{answer}</div>
          </Card>
          <Card as="section" aria-labelledby="check-heading">
            <CardHeader title="Show check" titleId="check-heading" detail="on the square as it is now" />
            <div className="p-4">
              <RunNotice run={run} />
              {run.isOk && (
                <FindingList findings={findings} presentMoment={presentMoment} onShowMoment={onShowMoment} />
              )}
            </div>
          </Card>
          <Card as="section" aria-labelledby="facts-heading">
            <CardHeader title="About it" titleId="facts-heading" />
            <Facts forward={forward} timeZone={timeZone} now={now} />
          </Card>
        </div>
      </div>
    </>
  );
}

function RunNotice({ run }: { run: RunSummary }) {
  if (run.isOk) return null;
  return (
    <Notice tone="stop" title="This show does not run.">
      {run.problem?.sentence ?? run.description}
    </Notice>
  );
}

function Facts({ forward, timeZone, now }: { forward: ForwardSummary; timeZone: string; now: number }) {
  return (
    <div className="p-4">
      <dl className="grid grid-cols-[7rem_1fr] gap-y-1 [&_dt]:text-slate">
        <dt>Song</dt>
        <dd>
          {forward.songTitle}, {presentLength(forward.seconds)}
        </dd>
        <dt>In public</dt>
        <dd className="flex items-center gap-1.5">
          <Icon name="lock" className="size-4 text-slate" />
          {forward.publicName}
        </dd>
        <dt>Forwarded</dt>
        <dd>
          {presentWhen(forward.forwardedAt, now, timeZone)} by {forward.teacherName}
        </dd>
      </dl>
      <Words by={forward.teacherName}>{forward.note}</Words>
    </div>
  );
}
