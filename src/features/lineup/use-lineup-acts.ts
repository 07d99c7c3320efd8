import { useState } from "react";
import type { Lineup } from "../../../shared/contracts/lineup.ts";
import { dismissToast, showToast } from "../../components/toast-queue.ts";
import { useChangeLineup } from "./api.ts";
import { type Change, findObstacle, invertChange, presentChange } from "./model/change.ts";

interface Undoable {
  readonly change: Change;
  readonly back: Change;
}

export interface LineupActs {
  /** Makes a change unless something stands in its way; gives whether it was made. */
  readonly apply: (change: Change) => boolean;
  /** Takes the last change back; null when there is none. */
  readonly undo: (() => void) | null;
  readonly isSaving: boolean;
  /** What happened last, for the live region. */
  readonly news: string;
  readonly announce: (news: string) => void;
}

/** Changes of the plan with their obstacles, news and the undo of the last one. */
export function useLineupActs(lineup: Lineup): LineupActs {
  const send = useChangeLineup();
  const [last, setLast] = useState<Undoable | null>(null);
  const [news, announce] = useState("");

  const run = (change: Change, said: string, remember: boolean) => {
    announce(said);
    setLast(null);
    send.mutate(
      { before: lineup, change },
      {
        onSuccess: (after) => {
          const back = invertChange(lineup, after, change);
          if (remember && back) setLast({ change, back });
        },
        onError: (error) => refuse(error.message),
      },
    );
  };
  const refuse = (reason: string) => {
    announce(reason);
    const id = showToast({ tone: "warn", title: reason });
    // It tells why a press did nothing: that is old news after a while.
    window.setTimeout(() => dismissToast(id), 8_000);
  };

  return {
    apply: (change) => {
      const obstacle = findObstacle(lineup, change);
      if (obstacle !== null) refuse(obstacle);
      else run(change, presentChange(lineup, change), true);
      return obstacle === null;
    },
    undo: last && (() => run(last.back, `Undone. ${presentChange(lineup, last.back)}`, false)),
    isSaving: send.isPending,
    news,
    announce,
  };
}
