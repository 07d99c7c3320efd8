import type { ReactNode } from "react";
import type { AssignmentDetail } from "../../../../shared/contracts/assignments.ts";
import { Card } from "../../../components/card.tsx";
import { Icon } from "../../../components/icon.tsx";
import { LinkButton } from "../../../components/link-button.tsx";
import { PageHeader } from "../../../components/page.tsx";
import { Tag } from "../../../components/tag.tsx";
import { useNow } from "../../../hooks/use-now.ts";
import { HERE } from "../../../lib/format.ts";
import { presentDue } from "../../../lib/zoned-time.ts";
import { describeRequirement } from "../model/requirement.ts";
import { studioActionOf } from "../model/next-step.ts";
import { RubricTable } from "./rubric-table.tsx";

export interface AssignmentBriefProps {
  detail: AssignmentDetail;
  /** What came back, above the brief once there is something. */
  feedback: ReactNode;
}

/** The brief, what the script must use, how it is marked, and the way into the studio. */
export function AssignmentBrief({ detail, feedback }: AssignmentBriefProps) {
  const { assignment, brief, requirements, rubric, teacherName } = detail;
  const action = studioActionOf(assignment, useNow());
  return (
    <>
      <PageHeader
        title={assignment.title}
        tag={assignment.mine && <Tag state={assignment.mine.state} />}
        lead={`${assignment.className} · set by ${teacherName} · due ${presentDue(assignment.dueAt, HERE)}`}
        actions={
          action.to !== null && (
            <LinkButton look="main" to={action.to} icon="pencil">
              {action.label}
            </LinkButton>
          )
        }
      />
      {action.reason !== null && <p className="mb-4 text-soft">{action.reason}</p>}
      <div className="space-y-8">
        {feedback}
        <section aria-labelledby="brief">
          <h2 id="brief" className="mb-2">
            The brief
          </h2>
          <div className="max-w-[62ch] space-y-3">
            {brief.split(/\n{2,}/).map((paragraph, i) => (
              <p key={i} className="whitespace-pre-line">
                {paragraph}
              </p>
            ))}
          </div>
        </section>
        <div className="grid grid-cols-2 gap-6 max-wide:grid-cols-1">
          <Card as="section" isPadded aria-labelledby="song">
            <h2 id="song" className="text-5">
              The song
            </h2>
            <p className="mt-1 flex items-center gap-2">
              <Icon name="music" /> {assignment.songTitle}
            </p>
          </Card>
          <Card as="section" isPadded aria-labelledby="must-use">
            <h2 id="must-use" className="text-5">
              Your script must use
            </h2>
            {requirements.length === 0 ? (
              <p className="mt-1">Whatever you like: nothing special is asked for.</p>
            ) : (
              <ul className="mt-1 space-y-1">
                {requirements.map((requirement) => (
                  <li key={requirement.kind} className="flex items-center gap-2">
                    <Icon name="check" /> {describeRequirement(requirement)}
                  </li>
                ))}
              </ul>
            )}
          </Card>
        </div>
        <section aria-labelledby="rubric">
          <h2 id="rubric" className="mb-2">
            How it is marked
          </h2>
          <RubricTable rubric={rubric} levels={null} />
        </section>
      </div>
    </>
  );
}
