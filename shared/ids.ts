import { z } from "zod";

/**
 * Ids. Rows are named by a random text id (22 characters, URL-safe). Each kind has its own schema and
 * type, so that a signature says which is meant. The shared builder loses zod's brand on the way: the
 * compiler takes any text for any of them, and only the schemas judge what comes from outside.
 */
const id = <const Brand extends string>(brand: Brand) =>
  z
    .string()
    .regex(/^[A-Za-z0-9_-]{4,40}$/, "This is not an id.")
    .brand<Brand>()
    .describe(`Id of a ${brand}`);

export const UserIdSchema = id("user");
export const SchoolIdSchema = id("school");
export const ClassIdSchema = id("class");
export const SongIdSchema = id("song");
export const LayoutIdSchema = id("layout");
export const ShowIdSchema = id("show");
export const VersionIdSchema = id("version");
export const AssignmentIdSchema = id("assignment");
export const SubmissionIdSchema = id("submission");
export const CommentIdSchema = id("comment");
export const ForwardIdSchema = id("forward");
export const NightIdSchema = id("night");
export const SlotIdSchema = id("slot");

export type UserId = z.infer<typeof UserIdSchema>;
export type SchoolId = z.infer<typeof SchoolIdSchema>;
export type ClassId = z.infer<typeof ClassIdSchema>;
export type SongId = z.infer<typeof SongIdSchema>;
export type LayoutId = z.infer<typeof LayoutIdSchema>;
export type ShowId = z.infer<typeof ShowIdSchema>;
export type VersionId = z.infer<typeof VersionIdSchema>;
export type AssignmentId = z.infer<typeof AssignmentIdSchema>;
export type SubmissionId = z.infer<typeof SubmissionIdSchema>;
export type CommentId = z.infer<typeof CommentIdSchema>;
export type ForwardId = z.infer<typeof ForwardIdSchema>;
export type NightId = z.infer<typeof NightIdSchema>;
export type SlotId = z.infer<typeof SlotIdSchema>;
