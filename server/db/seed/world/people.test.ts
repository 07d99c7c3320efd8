import { describe, expect, it } from "vitest";
import {
  ClassCodeSchema,
  NewPasswordSchema,
  PassphraseSchema,
  UsernameSchema,
} from "../../../../shared/contracts/auth.ts";
import { CLASSES, demoStudent, SCHOOLS, STAFF, STUDENTS } from "./people.ts";

describe("the people of the demo world", () => {
  it("are 130 students in six classes of two schools, five teachers, a coordinator and an admin", () => {
    expect(STUDENTS).toHaveLength(130);
    expect(CLASSES).toHaveLength(6);
    expect(new Set(CLASSES.map((one) => one.school))).toEqual(new Set(SCHOOLS.map((school) => school.key)));
    const count = (role: string) => STAFF.filter((one) => one.roles.some((held) => held === role)).length;
    expect([count("teacher"), count("coordinator"), count("admin")]).toEqual([5, 1, 1]);
  });

  it("have names that sign-in accepts, each once a class", () => {
    for (const student of STUDENTS) {
      expect(UsernameSchema.parse(student.username)).toBe(student.username);
      expect(PassphraseSchema.parse(student.passphrase)).toBe(student.passphrase);
      expect(student.passphrase.length).toBeGreaterThanOrEqual(15);
      expect(ClassCodeSchema.parse(student.classCode)).toBe(student.classCode);
    }
    expect(new Set(STUDENTS.map((student) => student.key)).size).toBe(130);
    expect(new Set(STUDENTS.map((student) => student.passphrase)).size).toBe(130);
    for (const one of STAFF) expect(NewPasswordSchema.safeParse(one.password).success, one.key).toBe(true);
    expect(() => demoStudent("7B-TARN/nobody")).toThrow(RangeError);
  });

  it("taught by somebody of their own school", () => {
    for (const one of CLASSES)
      for (const key of one.teachers) expect(STAFF.find((person) => person.key === key)?.school).toBe(one.school);
  });

  it("hold every answer about public names", () => {
    expect(new Set(STUDENTS.map((student) => student.consent))).toEqual(new Set(["yes", "no", "open"]));
  });
});
