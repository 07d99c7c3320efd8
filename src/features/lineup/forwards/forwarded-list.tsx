import type { ForwardSummary } from "../../../../shared/contracts/lineup.ts";
import { EmptyState } from "../../../components/empty-state.tsx";
import { LinkButton } from "../../../components/link-button.tsx";
import { List } from "../../../components/list.tsx";
import { ForwardRow, Words } from "./forward-row.tsx";

export interface ForwardedListProps {
  forwards: readonly ForwardSummary[];
  timeZone: string;
  now: number;
}

const ORDER = { declined: 0, waiting: 1, approved: 2, scheduled: 3 };

/** What a teacher forwarded and what became of it; what came back first. */
export function ForwardedList({ forwards, timeZone, now }: ForwardedListProps) {
  if (forwards.length === 0) {
    return (
      <EmptyState
        icon="send"
        title="Nothing forwarded yet"
        headingLevel={2}
        action={
          <LinkButton to="/marking" look="main" icon="pencil">
            Go to the marking
          </LinkButton>
        }
      >
        When a show is marked, forward it from the marking desk. The event’s coordinator watches it, and you read the
        answer here.
      </EmptyState>
    );
  }
  const order = [...forwards].sort((a, b) => ORDER[a.state] - ORDER[b.state] || b.forwardedAt - a.forwardedAt);
  return (
    <List className="rounded-sheet border border-line bg-card shadow-sheet-1">
      {order.map((forward) => {
        const desk = `/forwarded/${forward.id}`;
        return (
          <ForwardRow
            key={forward.id}
            forward={forward}
            to={desk}
            timeZone={timeZone}
            now={now}
            words={
              <>
                <Words by="You">{forward.note}</Words>
                <Words by="Coordinator">{forward.answer ?? ""}</Words>
              </>
            }
            actions={
              forward.state === "declined" && (
                <LinkButton to={desk} icon="turn" look="main" aria-label={`Open the work again: ${forward.title}`}>
                  Open the work again
                </LinkButton>
              )
            }
          />
        );
      })}
    </List>
  );
}
