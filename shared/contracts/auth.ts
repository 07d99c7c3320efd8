import { z } from "zod";
import { defineContract } from "../contract.ts";
import { ClassIdSchema, SchoolIdSchema, UserIdSchema } from "../ids.ts";
import { RoleSchema } from "../roles.ts";
import { InstantSchema } from "./common.ts";

/** A class code names a class and is no secret: `7B-TARN`. Case and spaces are forgiven. */
export const ClassCodeSchema = z
  .string()
  .trim()
  .transform((code) => code.toUpperCase().replace(/\s+/g, "-"))
  .pipe(z.string().regex(/^[A-Z0-9]{1,8}(-[A-Z0-9]{1,12}){0,2}$/, "A class code looks like 7B-TARN."));

export const UsernameSchema = z
  .string()
  .trim()
  .transform((name) => name.toLowerCase())
  .pipe(z.string().regex(/^[a-z][a-z0-9.-]{1,30}$/, "A username has small letters, numbers, dots and hyphens."));

/** Four words; spaces, hyphens and capitals are forgiven. 15 characters or more once joined. */
export const PassphraseSchema = z
  .string()
  .max(200, "That is too long.")
  .transform((text) =>
    text
      .toLowerCase()
      .trim()
      .split(/[\s-]+/)
      .join("-"),
  )
  .pipe(z.string().min(1, "Type your four words."));

export const PASSWORD_MIN_LENGTH = 15;
export const NewPasswordSchema = z
  .string()
  .min(PASSWORD_MIN_LENGTH, `Use at least ${PASSWORD_MIN_LENGTH} characters. A sentence works well.`)
  .max(256, "Use at most 256 characters.");

export const SignedInUserSchema = z.object({
  id: UserIdSchema,
  displayName: z.string(),
  roles: z.array(RoleSchema),
  schoolId: SchoolIdSchema.nullable(),
  schoolName: z.string().nullable(),
  /** Classes the person is enrolled in (student) or teaches (teacher). */
  classes: z.array(z.object({ id: ClassIdSchema, name: z.string(), code: z.string() })),
});
export type SignedInUser = z.infer<typeof SignedInUserSchema>;

export const SessionSchema = z.object({
  user: SignedInUserSchema,
  /** When the session ends at the latest, whatever is done. */
  endsAt: InstantSchema,
  /** When it ends if nothing is done. */
  idleEndsAt: InstantSchema,
});
export type Session = z.infer<typeof SessionSchema>;

export const authContract = defineContract({
  studentSignIn: {
    method: "POST",
    path: "/api/auth/student-sign-in",
    summary: "Signs a student in with class code, username and four words.",
    access: "anyone",
    body: z.object({ classCode: ClassCodeSchema, username: UsernameSchema, passphrase: PassphraseSchema }),
    response: SessionSchema,
    problems: ["invalid-request", "wrong-sign-in"],
  },
  staffSignIn: {
    method: "POST",
    path: "/api/auth/staff-sign-in",
    summary: "Signs a teacher, coordinator or admin in with e-mail and password.",
    access: "anyone",
    body: z.object({
      email: z.email("An e-mail address looks like name@school.example.").max(200),
      password: z.string().min(1, "Type your password.").max(256),
    }),
    response: SessionSchema,
    problems: ["invalid-request", "wrong-sign-in"],
  },
  session: {
    method: "GET",
    path: "/api/auth/session",
    summary: "Gives the session of the caller, or null.",
    access: "anyone",
    response: z.object({ session: SessionSchema.nullable() }),
  },
  signOut: {
    method: "POST",
    path: "/api/auth/sign-out",
    summary: "Ends this session.",
    access: "anyone",
    status: 204,
    response: z.void(),
  },
  signOutEverywhere: {
    method: "POST",
    path: "/api/auth/sign-out-everywhere",
    summary: "Ends every session of the caller, this one too.",
    access: "signed-in",
    status: 204,
    response: z.void(),
  },
  changePassword: {
    method: "POST",
    path: "/api/auth/change-password",
    summary: "Sets a new staff password and ends all other sessions.",
    access: [{ role: "teacher" }, { role: "coordinator" }, { role: "admin" }],
    body: z.object({ current: z.string().min(1, "Type the password you have now.").max(256), next: NewPasswordSchema }),
    status: 204,
    response: z.void(),
    problems: ["invalid-request", "wrong-sign-in"],
  },
  suggestPassphrases: {
    method: "GET",
    path: "/api/auth/passphrase-suggestions",
    summary: "Deals three passphrases of four words to choose from.",
    access: "anyone",
    response: z.object({ passphrases: z.array(z.string()).length(3) }),
  },
  redeemReset: {
    method: "POST",
    path: "/api/auth/redeem-reset",
    summary: "Uses a one-time code from the teacher to choose new words, and signs in.",
    access: "anyone",
    body: z.object({
      classCode: ClassCodeSchema,
      username: UsernameSchema,
      code: z
        .string()
        .trim()
        .transform((code) => code.toUpperCase().replace(/[\s-]/g, ""))
        .pipe(z.string().length(8, "The code has 8 letters and numbers.")),
      passphrase: PassphraseSchema,
    }),
    response: SessionSchema,
    problems: ["invalid-request", "wrong-sign-in"],
  },
});
