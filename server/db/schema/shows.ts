import { blob, index, integer, primaryKey, sqliteTable, text, uniqueIndex } from "drizzle-orm/sqlite-core";
import type { CommentAnchor } from "../../../shared/contracts/marking.ts";
import type { RunSummary } from "../../../shared/contracts/common.ts";
import type { WorkState } from "../../../shared/contracts/shows.ts";
import { assignments } from "./classroom.ts";
import { id, instant } from "./columns.ts";
import { beatMaps, songs, squareLayouts } from "./event.ts";
import { users } from "./identity.ts";

/** A script with its song and luck. The draft lives beside it; versions are immutable. */
export const shows = sqliteTable(
  "shows",
  {
    id: id(),
    title: text("title").notNull(),
    songId: text("song_id")
      .notNull()
      .references(() => songs.id),
    assignmentId: text("assignment_id").references(() => assignments.id),
    /** 32 bits, unsigned. */
    seed: integer("seed").notNull(),
    isArchived: integer("is_archived", { mode: "boolean" }).notNull().default(false),
    createdAt: instant("created_at").notNull(),
  },
  (table) => [index("shows_assignment").on(table.assignmentId)],
);

export const showAuthors = sqliteTable(
  "show_authors",
  {
    showId: text("show_id")
      .notNull()
      .references(() => shows.id, { onDelete: "cascade" }),
    userId: text("user_id")
      .notNull()
      .references(() => users.id, { onDelete: "cascade" }),
  },
  (table) => [primaryKey({ columns: [table.showId, table.userId] }), index("show_authors_user").on(table.userId)],
);

/** Classmates who were asked to write a show together and have not answered. */
export const showInvitations = sqliteTable(
  "show_invitations",
  {
    showId: text("show_id")
      .notNull()
      .references(() => shows.id, { onDelete: "cascade" }),
    userId: text("user_id")
      .notNull()
      .references(() => users.id, { onDelete: "cascade" }),
    askedBy: text("asked_by")
      .notNull()
      .references(() => users.id, { onDelete: "cascade" }),
    askedAt: instant("asked_at").notNull(),
  },
  (table) => [primaryKey({ columns: [table.showId, table.userId] }), index("show_invitations_user").on(table.userId)],
);

/** One row a show; `revision` counts every save, and a save names the revision it was written from. */
export const drafts = sqliteTable("drafts", {
  showId: text("show_id")
    .primaryKey()
    .references(() => shows.id, { onDelete: "cascade" }),
  revision: integer("revision").notNull(),
  source: text("source").notNull(),
  savedAt: instant("saved_at").notNull(),
  savedBy: text("saved_by").references(() => users.id),
  /** Ribbon cells of the draft's last good run on the server; null before. */
  ribbon: blob("ribbon", { mode: "buffer" }),
});

/**
 * Earlier texts of a draft: one row for a few minutes of one person's edits, so that a lesson is some
 * ten rows. The last row is the draft itself.
 */
export const draftHistory = sqliteTable(
  "draft_history",
  {
    showId: text("show_id")
      .notNull()
      .references(() => shows.id, { onDelete: "cascade" }),
    revision: integer("revision").notNull(),
    source: text("source").notNull(),
    /** The first save that went into the row. */
    beganAt: instant("began_at").notNull(),
    savedAt: instant("saved_at").notNull(),
    savedBy: text("saved_by").references(() => users.id),
    /** Ribbon cells of its run on the server; null when it did not run well. */
    ribbon: blob("ribbon", { mode: "buffer" }),
  },
  (table) => [primaryKey({ columns: [table.showId, table.revision] })],
);

/** What was handed in, as it was: never changed, never deleted (triggers refuse it). */
export const showVersions = sqliteTable(
  "show_versions",
  {
    id: id(),
    showId: text("show_id")
      .notNull()
      .references(() => shows.id),
    number: integer("number").notNull(),
    source: text("source").notNull(),
    seed: integer("seed").notNull(),
    language: integer("language").notNull(),
    songId: text("song_id")
      .notNull()
      .references(() => songs.id),
    layoutId: text("layout_id")
      .notNull()
      .references(() => squareLayouts.id),
    beatMapId: text("beat_map_id")
      .notNull()
      .references(() => beatMaps.id),
    createdBy: text("created_by")
      .notNull()
      .references(() => users.id),
    createdAt: instant("created_at").notNull(),
  },
  (table) => [uniqueIndex("show_versions_number").on(table.showId, table.number)],
);

/** Outcomes of running a version, insert-only: a changed square or song adds runs, never versions. */
export const runs = sqliteTable(
  "runs",
  {
    id: id(),
    versionId: text("version_id")
      .notNull()
      .references(() => showVersions.id),
    layoutId: text("layout_id")
      .notNull()
      .references(() => squareLayouts.id),
    beatMapId: text("beat_map_id")
      .notNull()
      .references(() => beatMaps.id),
    /** Hash of the engine build. */
    engine: text("engine").notNull(),
    /** Number of the rules of the show check. */
    rulesVersion: integer("rules_version").notNull(),
    summary: text("summary", { mode: "json" }).$type<RunSummary>().notNull(),
    hash: text("hash"),
    /** Binary codec of the timeline; null when nothing was written. */
    timeline: blob("timeline", { mode: "buffer" }),
    ribbon: blob("ribbon", { mode: "buffer" }),
    createdAt: instant("created_at").notNull(),
  },
  (table) => [index("runs_version").on(table.versionId, table.createdAt)],
);

/** One row a show and assignment; the version that counts is the latest handed in. */
export const submissions = sqliteTable(
  "submissions",
  {
    id: id(),
    assignmentId: text("assignment_id")
      .notNull()
      .references(() => assignments.id),
    showId: text("show_id")
      .notNull()
      .references(() => shows.id),
    versionId: text("version_id")
      .notNull()
      .references(() => showVersions.id),
    state: text("state").$type<Exclude<WorkState, "working">>().notNull(),
    handedInAt: instant("handed_in_at").notNull(),
    isLate: integer("is_late", { mode: "boolean" }).notNull(),
    /** Null: the browser sent no hash. */
    hashesAgree: integer("hashes_agree", { mode: "boolean" }),
  },
  (table) => [uniqueIndex("submissions_show").on(table.assignmentId, table.showId)],
);

/** State history, insert-only. */
export const submissionEvents = sqliteTable(
  "submission_events",
  {
    id: id(),
    submissionId: text("submission_id")
      .notNull()
      .references(() => submissions.id),
    versionId: text("version_id")
      .notNull()
      .references(() => showVersions.id),
    state: text("state").$type<WorkState>().notNull(),
    by: text("by")
      .notNull()
      .references(() => users.id),
    note: text("note"),
    at: instant("at").notNull(),
  },
  (table) => [index("submission_events_submission").on(table.submissionId)],
);

export const comments = sqliteTable(
  "comments",
  {
    id: id(),
    submissionId: text("submission_id")
      .notNull()
      .references(() => submissions.id),
    versionId: text("version_id")
      .notNull()
      .references(() => showVersions.id),
    authorId: text("author_id")
      .notNull()
      .references(() => users.id),
    anchor: text("anchor", { mode: "json" }).$type<CommentAnchor>().notNull(),
    body: text("body").notNull(),
    createdAt: instant("created_at").notNull(),
    deletedAt: instant("deleted_at"),
  },
  (table) => [index("comments_submission").on(table.submissionId)],
);

export const marks = sqliteTable("marks", {
  submissionId: text("submission_id")
    .primaryKey()
    .references(() => submissions.id),
  levels: text("levels", { mode: "json" }).$type<Record<string, number>>().notNull(),
  note: text("note").notNull(),
  markedBy: text("marked_by")
    .notNull()
    .references(() => users.id),
  savedAt: instant("saved_at").notNull(),
  releasedAt: instant("released_at"),
});

/** Answers kept for retries: the same key and the same request get the same answer. */
export const idempotencyKeys = sqliteTable(
  "idempotency_keys",
  {
    userId: text("user_id")
      .notNull()
      .references(() => users.id, { onDelete: "cascade" }),
    key: text("key").notNull(),
    /** SHA-256 of method, path and body. */
    requestHash: text("request_hash").notNull(),
    status: integer("status").notNull(),
    response: text("response").notNull(),
    createdAt: instant("created_at").notNull(),
  },
  (table) => [primaryKey({ columns: [table.userId, table.key] }), index("idempotency_keys_age").on(table.createdAt)],
);
