import { Link } from "react-router";
import type { AssignmentSummary } from "../../../../shared/contracts/assignments.ts";
import { EmptyState } from "../../../components/empty-state.tsx";
import { LinkButton } from "../../../components/link-button.tsx";
import { Skeleton, SkeletonGroup } from "../../../components/skeleton.tsx";
import { Tag } from "../../../components/tag.tsx";
import { presentDue } from "../../../lib/zoned-time.ts";

export interface AssignmentTableProps {
  assignments: readonly AssignmentSummary[];
  classId: string;
  timeZone: string;
  now: number;
}

/** The assignments of one class with how far the class is, newest due date first. */
export function AssignmentTable({ assignments, classId, timeZone, now }: AssignmentTableProps) {
  const order = [...assignments].sort((a, b) => b.dueAt - a.dueAt);
  const newAssignment = (
    <LinkButton to={`/classes/${classId}/assignments/new`} look="main" icon="plus">
      Set an assignment
    </LinkButton>
  );
  if (order.length === 0) {
    return (
      <EmptyState icon="pencil" title="No assignment yet" headingLevel={2} action={newAssignment}>
        An assignment gives the class a song, a brief, what the script must use, and the rubric by which you mark it.
      </EmptyState>
    );
  }
  return (
    <>
      <div className="mb-3 flex flex-wrap items-center gap-3">
        <h2>{order.length === 1 ? "1 assignment" : `${order.length} assignments`}</h2>
        <span className="ml-auto">{newAssignment}</span>
      </div>
      <ul className="divide-y divide-line rounded-sheet border border-line bg-card shadow-sheet-1">
        {order.map((assignment) => {
          const { submitted = 0, revise = 0, marked = 0 } = assignment.counts ?? {};
          const desk = submitted + revise + marked > 0 ? `/marking/${assignment.id}` : null;
          return (
            <li key={assignment.id} className="flex flex-wrap items-center gap-x-6 gap-y-2 px-4 py-3">
              <div className="min-w-60 flex-1">
                <h3>
                  {desk ? (
                    <Link to={desk} className="text-ink no-underline hover:underline">
                      {assignment.title}
                    </Link>
                  ) : (
                    assignment.title
                  )}
                </h3>
                <p className="mt-0.5 text-meta text-slate">
                  {assignment.songTitle} · due {presentDue(assignment.dueAt, timeZone)}
                  {assignment.dueAt < now && (assignment.lateRule === "closed" ? " · closed" : " · late work is taken")}
                </p>
              </div>
              {assignment.counts && <Counts counts={assignment.counts} />}
              <div className="flex gap-2">
                <LinkButton
                  to={`/assignments/${assignment.id}/edit`}
                  icon="pencil"
                  aria-label={`Change ${assignment.title}`}
                >
                  Change
                </LinkButton>
                {desk && (
                  <LinkButton
                    to={desk}
                    look={submitted > 0 ? "main" : "plain"}
                    icon="rubric"
                    aria-label={`Mark ${assignment.title}`}
                  >
                    Mark
                  </LinkButton>
                )}
              </div>
            </li>
          );
        })}
      </ul>
    </>
  );
}

function Counts({ counts }: { counts: NonNullable<AssignmentSummary["counts"]> }) {
  const begun = counts.working + counts.submitted + counts.revise + counts.marked;
  const notBegun = Math.max(0, counts.students - begun);
  return (
    <ul aria-label="How far the class is" className="flex flex-wrap items-center gap-1.5">
      {notBegun > 0 && (
        <li>
          <Tag state="plain" icon="moon">
            {notBegun} not begun
          </Tag>
        </li>
      )}
      {counts.working > 0 && (
        <li>
          <Tag state="working">{counts.working} working</Tag>
        </li>
      )}
      {counts.submitted > 0 && (
        <li>
          <Tag state="submitted">{counts.submitted} submitted</Tag>
        </li>
      )}
      {counts.revise > 0 && (
        <li>
          <Tag state="revise">{counts.revise} revise</Tag>
        </li>
      )}
      {counts.marked > 0 && (
        <li>
          <Tag state="marked">{counts.marked} marked</Tag>
        </li>
      )}
    </ul>
  );
}

export function AssignmentTableSkeleton() {
  return (
    <SkeletonGroup
      label="Loading the assignments"
      className="divide-y divide-line rounded-sheet border border-line bg-card"
    >
      {["first", "second"].map((row) => (
        <div key={row} className="space-y-3 px-4 py-4">
          <Skeleton className="w-56 max-w-full" />
          <Skeleton className="w-80 max-w-full" />
        </div>
      ))}
    </SkeletonGroup>
  );
}
