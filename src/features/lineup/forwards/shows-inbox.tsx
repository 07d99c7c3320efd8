import type { ForwardSummary } from "../../../../shared/contracts/lineup.ts";
import { EmptyState } from "../../../components/empty-state.tsx";
import { List } from "../../../components/list.tsx";
import { LinkButton } from "../../../components/link-button.tsx";
import { Skeleton, SkeletonGroup } from "../../../components/skeleton.tsx";
import { Tabs } from "../../../components/tabs.tsx";
import { ForwardRow, Words } from "./forward-row.tsx";

export const INBOX_VIEWS = ["waiting", "approved", "declined"] as const;
export type InboxView = (typeof INBOX_VIEWS)[number];

export interface ShowsInboxProps {
  forwards: readonly ForwardSummary[];
  view: InboxView;
  onView: (view: InboxView) => void;
  timeZone: string;
  now: number;
}

const EMPTY: Record<InboxView, { title: string; text: string }> = {
  waiting: { title: "No show waits for you", text: "Shows come here when a teacher forwards them." },
  approved: {
    title: "No show is approved yet",
    text: "Watch a waiting show and approve it; then it can be placed in the lineup.",
  },
  declined: {
    title: "No show was sent back",
    text: "A show that you send back to its teacher stays here with your note.",
  },
};

/** The coordinator's shows: waiting (longest first), approved with those on the plan, sent back. */
export function ShowsInbox({ forwards, view, onView, timeZone, now }: ShowsInboxProps) {
  const listView = (one: InboxView) => {
    const states: readonly string[] = one === "approved" ? ["approved", "scheduled"] : [one];
    const sign = one === "waiting" ? 1 : -1;
    return forwards
      .filter((forward) => states.includes(forward.state))
      .sort((a, b) => sign * (a.forwardedAt - b.forwardedAt));
  };
  return (
    <Tabs
      label="Which shows"
      selectedId={view}
      onSelect={(id) => onView(INBOX_VIEWS.find((one) => one === id) ?? "waiting")}
      tabs={INBOX_VIEWS.map((one) => {
        const list = listView(one);
        return {
          id: one,
          label: { waiting: "Waiting", approved: "Approved", declined: "Sent back" }[one],
          icon: ({ waiting: "clock", approved: "tick", declined: "turn" } as const)[one],
          count: list.length,
          content:
            list.length === 0 ? (
              <EmptyState icon="ribbon" title={EMPTY[one].title} headingLevel={2}>
                {EMPTY[one].text}
              </EmptyState>
            ) : (
              <List className="rounded-sheet border border-line bg-card shadow-sheet-1">
                {list.map((forward) => (
                  <ForwardRow
                    key={forward.id}
                    forward={forward}
                    to={`/event/shows/${forward.id}`}
                    timeZone={timeZone}
                    now={now}
                    words={
                      <>
                        <Words by={forward.teacherName}>{forward.note}</Words>
                        <Words by="You">{forward.answer ?? ""}</Words>
                      </>
                    }
                    actions={
                      <LinkButton
                        to={`/event/shows/${forward.id}`}
                        icon="eye"
                        look={one === "waiting" ? "main" : "plain"}
                        aria-label={`Watch ${forward.title}`}
                      >
                        Watch
                      </LinkButton>
                    }
                  />
                ))}
              </List>
            ),
        };
      })}
    />
  );
}

export function ForwardsSkeleton() {
  return (
    <SkeletonGroup label="Loading the shows" className="divide-y divide-line rounded-sheet border border-line bg-card">
      {["first", "second", "third"].map((row) => (
        <div key={row} className="space-y-2.5 px-4 py-4">
          <Skeleton className="w-48 max-w-full" />
          <Skeleton className="w-96 max-w-full" />
          <Skeleton shape="ribbon" className="h-4! max-w-xl" />
        </div>
      ))}
    </SkeletonGroup>
  );
}
