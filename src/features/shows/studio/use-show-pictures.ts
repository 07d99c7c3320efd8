import { useEffect, useState } from "react";
import type { ShowDescription } from "../../../../sandbox/timeline/describe.ts";
import type { Timeline } from "../../../../sandbox/timeline/model.ts";
import type { RibbonCells, RibbonSize } from "../../../../sandbox/timeline/ribbon.ts";
import { afterPaint } from "./after-paint.ts";

/** What is worked out of a timeline beside the page. */
export interface ShowPictures {
  readonly drawRibbon: (timeline: Timeline, size: RibbonSize) => Promise<RibbonCells>;
  readonly describeShow: (timeline: Timeline) => Promise<ShowDescription>;
}

/** The ribbon of a timeline; the one before stays until it has come. Null without a timeline. */
export function useRibbonCells(
  timeline: Timeline | null,
  drawRibbon: ShowPictures["drawRibbon"],
  size: RibbonSize,
): RibbonCells | null {
  return useWorkedOut(timeline, size, drawRibbon);
}

/** A show in words; the words before stay until they have come. Null without a timeline. */
export function useDescription(
  timeline: Timeline | null,
  describeShow: ShowPictures["describeShow"],
): ShowDescription | null {
  return useWorkedOut(timeline, null, describeShow);
}

/** The newest answer about a timeline. An answer that is overtaken, or does not come, changes nothing. */
function useWorkedOut<Question, Answer>(
  timeline: Timeline | null,
  question: Question,
  ask: (timeline: Timeline, question: Question) => Promise<Answer>,
): Answer | null {
  const [answer, setAnswer] = useState<Answer | null>(null);
  useEffect(() => {
    if (!timeline) return;
    let isOvertaken = false;
    const cancel = afterPaint(() => {
      ask(timeline, question).then(
        (found) => isOvertaken || setAnswer(found),
        () => undefined,
      );
    });
    return () => {
      isOvertaken = true;
      cancel();
    };
  }, [timeline, question, ask]);
  return timeline ? answer : null;
}
