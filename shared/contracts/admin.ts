import { z } from "zod";
import { defineContract } from "../contract.ts";
import { SchoolIdSchema, UserIdSchema } from "../ids.ts";
import { type Grant, RoleSchema } from "../roles.ts";
import { InstantSchema, lineText } from "./common.ts";
import { NewPasswordSchema } from "./auth.ts";

const admin: readonly Grant[] = [{ role: "admin" }];

export const StaffRowSchema = z.object({
  id: UserIdSchema,
  displayName: z.string(),
  email: z.string(),
  roles: z.array(RoleSchema),
  schoolName: z.string().nullable(),
  isDisabled: z.boolean(),
  lastSeenAt: InstantSchema.nullable(),
});
export type StaffRow = z.infer<typeof StaffRowSchema>;

export const AuditRowSchema = z.object({
  id: z.int(),
  at: InstantSchema,
  actorName: z.string().nullable(),
  event: z.string(),
  subject: z.string().nullable(),
});
export type AuditRow = z.infer<typeof AuditRowSchema>;

export const adminContract = defineContract({
  overview: {
    method: "GET",
    path: "/api/admin/overview",
    summary: "Gives the schools, the staff and the state of the installation.",
    access: admin,
    response: z.object({
      schools: z.array(z.object({ id: SchoolIdSchema, name: z.string(), classCount: z.int(), studentCount: z.int() })),
      staff: z.array(StaffRowSchema),
      database: z.object({ bytes: z.int(), sqliteVersion: z.string(), lastBackupAt: InstantSchema.nullable() }),
    }),
  },
  addStaff: {
    method: "POST",
    path: "/api/admin/staff",
    summary: "Adds a staff account with a first password.",
    access: admin,
    body: z.object({
      displayName: lineText(80),
      email: z.email("An e-mail address looks like name@school.example.").max(200),
      roles: z.array(z.enum(["teacher", "coordinator", "admin"])).min(1, "Choose at least one role."),
      schoolId: SchoolIdSchema.nullable(),
      password: NewPasswordSchema,
    }),
    status: 201,
    response: z.object({ staff: StaffRowSchema }),
    problems: ["invalid-request", "already-done"],
  },
  setDisabled: {
    method: "PUT",
    path: "/api/admin/staff/:userId/disabled",
    summary: "Disables a staff account and ends its sessions, or enables it again.",
    access: admin,
    params: z.object({ userId: UserIdSchema }),
    body: z.object({ isDisabled: z.boolean() }),
    response: z.object({ staff: StaffRowSchema }),
    problems: ["not-found", "wrong-state"],
  },
  audit: {
    method: "GET",
    path: "/api/admin/audit",
    summary: "Lists the audit log, newest first.",
    access: admin,
    query: z.object({ before: z.coerce.number().int().min(1).optional() }),
    response: z.object({ rows: z.array(AuditRowSchema), hasMore: z.boolean(), isChainWhole: z.boolean() }),
  },
});
