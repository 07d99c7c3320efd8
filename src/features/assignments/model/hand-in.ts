import type { HandInResult } from "../../../../shared/contracts/assignments.ts";
import { describeRequirement } from "./requirement.ts";

/** What a hand-in came to, in words: never a refusal, but plainly what the teacher will see. */
export function describeHandIn(result: HandInResult): { tone: "ok" | "warn"; title: string; detail: string } {
  const { run, unmet, isLate, hashesAgree, versionNumber } = result;
  const stops = run.findings.filter((finding) => finding.severity === "stop").length;
  const remarks = [
    run.isOk ? null : "It is marked “does not run”.",
    stops === 0 ? null : stops === 1 ? "The show check has 1 stop." : `The show check has ${stops} stops.`,
    unmet.length === 0 ? null : `Not in it yet: ${unmet.map(describeRequirement).join("; ")}.`,
    isLate ? "It came after the due date." : null,
    hashesAgree === false ? "The server's run came out different from your screen's; the server's counts." : null,
  ].filter((remark) => remark !== null);
  return {
    tone: remarks.length === 0 ? "ok" : "warn",
    title: `Handed in as version ${versionNumber}.`,
    detail: remarks.length === 0 ? "Your teacher has it." : remarks.join(" "),
  };
}
