import { describe, expect, it } from "vitest";
import { checkDraft, presentField, toDraft, toNewDraft } from "./assignment-form-model.ts";
import { parseDueText, toDueText } from "./due-date.ts";
import { buildCriterion, toFreeCriterionId } from "./starting-rubric.ts";

const ZONE = "America/New_York";
const NOW = Date.parse("2026-12-01T15:00:00Z");
const draft = { ...toNewDraft(NOW, ZONE), title: "A show with a chorus", songId: "song-bells" };

describe("due dates", () => {
  it("are read and written in the school's zone, on both sides of a change of the clocks", () => {
    expect(parseDueText("2026-12-04T15:30", ZONE)).toBe(Date.parse("2026-12-04T20:30:00Z"));
    expect(parseDueText("2026-10-30T15:30", ZONE)).toBe(Date.parse("2026-10-30T19:30:00Z"));
    expect(toDueText(Date.parse("2026-12-04T20:30:00Z"), ZONE)).toBe("2026-12-04T15:30");
  });
  it("refuse a time that the clocks leap over, and text that is no date", () => {
    // 02:30 on 14 March 2027 does not exist there: IANA time zone database, America/New_York.
    expect(parseDueText("2027-03-14T02:30", ZONE)).toBeNull();
    expect(parseDueText("", ZONE)).toBeNull();
  });
});

describe("checkDraft", () => {
  it("gives the fields of a complete form, asked-for uses only", () => {
    const { fields } = checkDraft({ ...draft, uses: { ...draft.uses, loop: 2 } }, { zone: ZONE, now: NOW });
    expect(fields).toMatchObject({
      title: "A show with a chorus",
      requirements: [{ kind: "loop", atLeast: 2 }],
      dueAt: Date.parse("2026-12-08T20:30:00Z"),
    });
    expect(fields?.rubric).toHaveLength(4);
  });

  it("names every bad field in the order of the form", () => {
    const bad = {
      ...toNewDraft(NOW, ZONE),
      due: "2026-11-01T10:00",
      rubric: [
        buildCriterion("one", ""),
        {
          ...buildCriterion("two", "Two"),
          levels: buildCriterion("two", "").levels.map((level, index) =>
            index === 2 ? { ...level, name: "" } : level,
          ),
        },
      ],
    };
    const { errors } = checkDraft(bad, { zone: ZONE, now: NOW });
    expect(errors?.map((error) => error.fieldId)).toEqual([
      "title",
      "songId",
      "due",
      "rubric-0-name",
      "rubric-1-levels-2-name",
    ]);
    expect(errors?.map((error) => presentField(error.fieldId))).toEqual([
      "Title",
      "Song",
      "Due",
      "Criterion 1, name",
      "Criterion 2, level 3",
    ]);
  });

  it("asks for at least one criterion", () => {
    expect(checkDraft({ ...draft, rubric: [] }, { zone: ZONE, now: NOW }).errors).toEqual([
      { fieldId: "rubric", message: "A rubric needs at least one criterion." },
    ]);
  });

  it("lets a due date that is over stay, but takes no new one", () => {
    const over = { ...draft, due: "2026-11-20T15:30" };
    expect(checkDraft(over, { zone: ZONE, now: NOW, keptDue: Date.parse("2026-11-20T20:30:00Z") }).errors).toBeNull();
    expect(checkDraft(over, { zone: ZONE, now: NOW }).errors?.[0]?.fieldId).toBe("due");
  });
});

describe("toDraft", () => {
  it("takes an assignment there and back", () => {
    const { fields } = checkDraft({ ...draft, uses: { ...draft.uses, function: 1 } }, { zone: ZONE, now: NOW });
    if (!fields) throw new Error("The form is complete.");
    const back = toDraft(
      {
        assignment: { ...fields, id: "a", classId: "c", className: "7B", songTitle: "", mine: null, counts: null },
        brief: fields.brief,
        requirements: fields.requirements,
        rubric: fields.rubric,
        teacherName: "",
      },
      ZONE,
    );
    expect(checkDraft(back, { zone: ZONE, now: NOW }).fields).toEqual(fields);
  });
});

describe("toFreeCriterionId", () => {
  it("leaves out ids that are taken", () => {
    expect(toFreeCriterionId(["song", "criterion-3"])).toBe("criterion-4");
  });
});
