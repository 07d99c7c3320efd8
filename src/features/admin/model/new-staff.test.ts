import { describe, expect, it } from "vitest";
import { checkStaffDraft, EMPTY_STAFF_DRAFT } from "./new-staff.ts";

const whole = {
  ...EMPTY_STAFF_DRAFT,
  displayName: "Ms Marlow",
  email: " marlow@tarn-road.example ",
  schoolId: "school-tarn",
  password: "a sentence about the tea room",
};

describe("checkStaffDraft", () => {
  it("gives the account to add, without spaces round the address", () => {
    expect(checkStaffDraft(whole).body).toMatchObject({
      displayName: "Ms Marlow",
      email: "marlow@tarn-road.example",
      roles: ["teacher"],
      schoolId: "school-tarn",
    });
  });
  it("names every bad field", () => {
    const { errors } = checkStaffDraft({ ...EMPTY_STAFF_DRAFT, roles: [], password: "short" });
    expect(Object.keys(errors ?? {}).sort()).toEqual(["displayName", "email", "password", "roles"]);
  });
  it("asks for a teacher's school, and lets a coordinator have none", () => {
    expect(checkStaffDraft({ ...whole, schoolId: "" }).errors).toEqual({
      schoolId: "Choose the school of this teacher.",
    });
    expect(checkStaffDraft({ ...whole, roles: ["coordinator"], schoolId: "" }).body?.schoolId).toBeNull();
  });
});
