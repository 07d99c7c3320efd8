import type { Finding } from "../engine/model.ts";
import { RUN_FINDINGS, type RunFindingCode } from "./problems/findings.ts";
import { fillSentence, type SentenceValues } from "./sentence.ts";

/** Where a finding was seen; what is left out is empty. */
export interface FindingPlace {
  readonly moments?: readonly number[];
  readonly lines?: readonly number[];
  readonly measured?: Finding["measured"];
}

/** A finding of a run or of a script's text, with its words filled in. */
export function createFinding(rule: RunFindingCode, values: SentenceValues, place: FindingPlace): Finding {
  const { severity, sentence, hint } = RUN_FINDINGS[rule];
  return {
    rule,
    severity,
    sentence: fillSentence(sentence, values),
    hint: fillSentence(hint, values),
    moments: place.moments ?? [],
    lights: [],
    lines: place.lines ?? [],
    ...(place.measured === undefined ? {} : { measured: place.measured }),
  };
}

/** Whether a text is the rule of a finding that a run makes. */
export function isRunFinding(rule: string): rule is RunFindingCode {
  return Object.hasOwn(RUN_FINDINGS, rule);
}
