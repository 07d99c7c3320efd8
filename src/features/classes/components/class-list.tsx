import type { ClassSummary } from "../../../../shared/contracts/classes.ts";
import { EmptyState } from "../../../components/empty-state.tsx";
import { LinkButton } from "../../../components/link-button.tsx";
import { List, ListRow } from "../../../components/list.tsx";
import { Skeleton, SkeletonGroup } from "../../../components/skeleton.tsx";
import { Tag } from "../../../components/tag.tsx";

export interface ClassListProps {
  classes: readonly ClassSummary[];
}

/** The teacher's classes with what waits in each. */
export function ClassList({ classes }: ClassListProps) {
  if (classes.length === 0) {
    return (
      <EmptyState icon="people" title="You have no class yet" headingLevel={2}>
        The admin of your school gives classes to teachers. Ask for yours; it is here as soon as it is made.
      </EmptyState>
    );
  }
  return (
    <List className="rounded-sheet border border-line bg-card shadow-sheet-1">
      {classes.map((one) => (
        <ListRow
          key={one.id}
          level={2}
          className="px-4"
          title={one.name}
          to={`/classes/${one.id}`}
          line={`${one.schoolName} · ${one.studentCount === 1 ? "1 student" : `${one.studentCount} students`} · class code ${one.code}`}
          tag={one.toMarkCount > 0 ? <Tag state="submitted">{one.toMarkCount} to mark</Tag> : undefined}
          actions={
            <>
              <LinkButton to={`/classes/${one.id}/work`} icon="pencil" aria-label={`Work of ${one.name}`}>
                Work
              </LinkButton>
              <LinkButton to={`/classes/${one.id}/cards`} icon="card" aria-label={`Cards and codes of ${one.name}`}>
                Cards
              </LinkButton>
            </>
          }
        />
      ))}
    </List>
  );
}

export function ClassListSkeleton() {
  return (
    <SkeletonGroup
      label="Loading your classes"
      className="divide-y divide-line rounded-sheet border border-line bg-card"
    >
      {["first", "second"].map((row) => (
        <div key={row} className="space-y-3 px-4 py-4">
          <Skeleton className="w-24" />
          <Skeleton className="w-80 max-w-full" />
        </div>
      ))}
    </SkeletonGroup>
  );
}
