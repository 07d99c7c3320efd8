import type { MarkingInbox } from "../api.ts";
import { EmptyState } from "../../../components/empty-state.tsx";
import { LinkButton } from "../../../components/link-button.tsx";
import { List, ListRow } from "../../../components/list.tsx";
import { Skeleton, SkeletonGroup } from "../../../components/skeleton.tsx";
import { Tag } from "../../../components/tag.tsx";
import { presentDue } from "../../../lib/zoned-time.ts";

export interface InboxProps {
  assignments: MarkingInbox;
  timeZone: string;
}

/** The teacher's assignments, what waits for a mark first. */
export function Inbox({ assignments, timeZone }: InboxProps) {
  if (assignments.length === 0) {
    return (
      <EmptyState
        icon="pencil"
        title="No assignment yet"
        headingLevel={2}
        action={
          <LinkButton to="/classes" look="main" icon="people">
            Go to your classes
          </LinkButton>
        }
      >
        What your students hand in waits here for a mark. Begin by setting an assignment for a class.
      </EmptyState>
    );
  }
  const order = [...assignments].sort((a, b) => Number(b.toMark > 0) - Number(a.toMark > 0) || a.dueAt - b.dueAt);
  return (
    <List className="rounded-sheet border border-line bg-card shadow-sheet-1">
      {order.map((assignment) => {
        const desk = toDesk(assignment);
        return (
          <ListRow
            key={assignment.id}
            level={2}
            className="px-4"
            title={assignment.title}
            to={desk ?? undefined}
            line={`${assignment.className} · due ${presentDue(assignment.dueAt, timeZone)} · ${presentCounts(assignment)}`}
            tag={
              assignment.toMark > 0 ? (
                <Tag state="submitted">{assignment.toMark} to mark</Tag>
              ) : desk ? (
                <Tag state="ok">Nothing waits</Tag>
              ) : (
                <Tag state="plain">Nothing handed in</Tag>
              )
            }
            actions={
              desk && (
                <LinkButton
                  to={desk}
                  look={assignment.toMark > 0 ? "main" : "plain"}
                  icon="pencil"
                  aria-label={`${assignment.toMark > 0 ? "Mark" : "Look at"} ${assignment.title}, ${assignment.className}`}
                >
                  {assignment.toMark > 0 ? "Mark" : "Look"}
                </LinkButton>
              )
            }
          />
        );
      })}
    </List>
  );
}

/** The desk, at what has waited longest; null when nothing was handed in. */
function toDesk({ id, firstSubmissionId, sentBack, marked }: MarkingInbox[number]): string | null {
  if (firstSubmissionId) return `/marking/${id}/${firstSubmissionId}`;
  return sentBack + marked > 0 ? `/marking/${id}` : null;
}

function presentCounts({ sentBack, marked }: MarkingInbox[number]): string {
  return [`${marked} marked`, sentBack > 0 ? `${sentBack} sent back` : null].filter(Boolean).join(", ");
}

export function InboxSkeleton() {
  return (
    <SkeletonGroup
      label="Loading what waits for a mark"
      className="divide-y divide-line rounded-sheet border border-line bg-card"
    >
      {["first", "second", "third"].map((row) => (
        <div key={row} className="space-y-3 px-4 py-4">
          <Skeleton className="w-64 max-w-full" />
          <Skeleton className="w-96 max-w-full" />
        </div>
      ))}
    </SkeletonGroup>
  );
}
