import type { AssignmentSummary } from "../../../../shared/contracts/assignments.ts";
import { LinkButton } from "../../../components/link-button.tsx";
import { List, ListRow } from "../../../components/list.tsx";
import { Tag } from "../../../components/tag.tsx";
import { HERE } from "../../../lib/format.ts";
import { presentDue } from "../../../lib/zoned-time.ts";
import { nextStepOf, sortByNextStep } from "../model/next-step.ts";

export interface AssignmentRowsProps {
  assignments: readonly AssignmentSummary[];
  now: number;
}

/** A pupil's assignments: what is asked next of each stands on its button. */
export function AssignmentRows({ assignments, now }: AssignmentRowsProps) {
  return (
    <List>
      {sortByNextStep(assignments, now).map((assignment) => {
        const step = nextStepOf(assignment, now);
        return (
          <ListRow
            key={assignment.id}
            title={assignment.title}
            to={`/assignments/${assignment.id}`}
            line={`${assignment.songTitle} · ${step.line ?? `due ${presentDue(assignment.dueAt, HERE)}`}`}
            tag={assignment.mine ? <Tag state={assignment.mine.state} /> : null}
            actions={
              <LinkButton
                look={step.isUrgent ? "main" : "plain"}
                to={step.to}
                aria-label={`${step.label}: ${assignment.title}`}
              >
                {step.label}
              </LinkButton>
            }
          />
        );
      })}
    </List>
  );
}
