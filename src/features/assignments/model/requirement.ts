import { type Requirement, REQUIREMENT_NAMES } from "../../../../shared/contracts/assignments.ts";

/** A requirement in words: "a loop", or "a loop, 3 times". */
export function describeRequirement({ kind, atLeast }: Requirement): string {
  return atLeast === 1 ? REQUIREMENT_NAMES[kind] : `${REQUIREMENT_NAMES[kind]}, ${atLeast} times`;
}
