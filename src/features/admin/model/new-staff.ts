import { adminContract } from "../../../../shared/contracts/admin.ts";
import type { NewStaff } from "../api.ts";

export interface StaffDraft {
  readonly displayName: string;
  readonly email: string;
  readonly roles: readonly NewStaff["roles"][number][];
  /** Empty: no school, the person works for the event. */
  readonly schoolId: string;
  readonly password: string;
}

export const EMPTY_STAFF_DRAFT: StaffDraft = {
  displayName: "",
  email: "",
  roles: ["teacher"],
  schoolId: "",
  password: "",
};

export const STAFF_ROLES = ["teacher", "coordinator", "admin"] as const;

/** The account to send, or the first thing wrong with each field, by field name. */
export function checkStaffDraft(
  draft: StaffDraft,
): { body: NewStaff; errors: null } | { body: null; errors: Readonly<Record<string, string>> } {
  const parsed = adminContract.addStaff.body.safeParse({
    ...draft,
    displayName: draft.displayName,
    email: draft.email.trim(),
    schoolId: draft.schoolId === "" ? null : draft.schoolId,
  });
  const errors: Record<string, string> = {};
  if (draft.roles.includes("teacher") && draft.schoolId === "") errors.schoolId = "Choose the school of this teacher.";
  for (const issue of parsed.error?.issues ?? []) errors[String(issue.path[0])] ??= issue.message;
  return parsed.success && Object.keys(errors).length === 0
    ? { body: parsed.data, errors: null }
    : { body: null, errors };
}
