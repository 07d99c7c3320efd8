import type { Problem, SourceRange } from "../engine/model.ts";
import { PROBLEMS, type ProblemCode } from "./problems/index.ts";
import { fillSentence, type SentenceValues } from "./sentence.ts";

/** What a problem has besides its words. */
export interface ProblemPlace {
  readonly range: SourceRange;
  readonly excerpt: string;
  readonly details?: string;
  readonly fix?: Problem["fix"];
}

/** A problem of the catalogue with its sentence and hint filled in. A code outside the catalogue is a bug and throws. */
export function createProblem(code: ProblemCode, values: SentenceValues, place: ProblemPlace): Problem {
  const entry = PROBLEMS[code];
  return { code, sentence: fillSentence(entry.sentence, values), hint: fillSentence(entry.hint, values), ...place };
}

/** Whether a text is a code of the catalogue. */
export function isProblemCode(code: string): code is ProblemCode {
  return Object.hasOwn(PROBLEMS, code);
}
