import { describe, expect, it } from "vitest";
import type { HandInResult } from "../../../../shared/contracts/assignments.ts";
import { describeHandIn } from "./hand-in.ts";

const result = (fields: Partial<HandInResult>): HandInResult => ({
  submissionId: "submission-1",
  state: "submitted",
  versionNumber: 2,
  isLate: false,
  run: { isOk: true, problem: null, hash: null, cueCount: 4, findings: [], seconds: 90, description: "" },
  hashesAgree: true,
  unmet: [],
  ...fields,
});

describe("describeHandIn", () => {
  it("says only that it is in when there is nothing to remark", () => {
    expect(describeHandIn(result({}))).toEqual({
      tone: "ok",
      title: "Handed in as version 2.",
      detail: "Your teacher has it.",
    });
  });

  it("names everything the teacher will see", () => {
    const said = describeHandIn(
      result({
        isLate: true,
        hashesAgree: false,
        unmet: [{ kind: "loop", atLeast: 1 }],
        run: {
          ...result({}).run,
          isOk: false,
          findings: [{ rule: "street-flash", severity: "stop", sentence: "", moments: [], lights: [], lines: [] }],
        },
      }),
    );
    expect(said.tone).toBe("warn");
    expect(said.detail).toBe(
      "It is marked “does not run”. The show check has 1 stop. Not in it yet: a loop. It came after the due date. The server's run came out different from your screen's; the server's counts.",
    );
  });
});
