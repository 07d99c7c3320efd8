import type { z } from "zod";
import type { FindingSchema, ScriptProblemSchema } from "../../shared/contracts/common.ts";
import type { Finding, Problem } from "../../sandbox/engine/model.ts";

/** A script's problem for the wire; its certain fix is the editor's business and stays behind. */
export function presentProblem({
  code,
  sentence,
  hint,
  range,
  excerpt,
  details,
}: Problem): z.infer<typeof ScriptProblemSchema> {
  const { line, column, endLine, endColumn } = range;
  return {
    code,
    sentence,
    hint,
    range: { line, column, endLine, endColumn },
    excerpt,
    ...(details === undefined ? {} : { details }),
  };
}

/** A finding for the wire. */
export function presentFinding(finding: Finding): z.infer<typeof FindingSchema> {
  const { rule, severity, sentence, hint, measured } = finding;
  return {
    rule,
    severity,
    sentence,
    ...(hint === undefined ? {} : { hint }),
    ...(measured === undefined
      ? {}
      : { measured: { value: measured.value, limit: measured.limit, unit: measured.unit } }),
    moments: [...finding.moments],
    lights: [...finding.lights],
    lines: [...finding.lines],
  };
}
