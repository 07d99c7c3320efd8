import { blob, index, integer, sqliteTable, text, uniqueIndex } from "drizzle-orm/sqlite-core";
import type { BeatMap } from "../../../shared/contracts/songs.ts";
import type { Layout } from "../../../shared/contracts/square.ts";
import type { ForwardState } from "../../../shared/contracts/shows.ts";
import { id, instant } from "./columns.ts";
import { users } from "./identity.ts";

/** One installation site in numbered layouts; drafts follow `currentLayoutId`. */
export const squares = sqliteTable("squares", {
  id: id(),
  name: text("name").notNull(),
  townName: text("town_name").notNull(),
  eventName: text("event_name").notNull(),
  timeZone: text("time_zone").notNull(),
  currentLayoutId: text("current_layout_id"),
});

/** Frozen once anything refers to it: inserted, never updated (triggers refuse it). */
export const squareLayouts = sqliteTable(
  "square_layouts",
  {
    id: id(),
    squareId: text("square_id")
      .notNull()
      .references(() => squares.id),
    number: integer("number").notNull(),
    hash: text("hash").notNull(),
    layout: text("layout", { mode: "json" }).$type<Layout>().notNull(),
    createdAt: instant("created_at").notNull(),
  },
  (table) => [uniqueIndex("square_layouts_number").on(table.squareId, table.number)],
);

export const songs = sqliteTable("songs", {
  id: id(),
  title: text("title").notNull().unique(),
  credit: text("credit").notNull(),
  currentBeatMapId: text("current_beat_map_id"),
});

export const songFiles = sqliteTable("song_files", {
  id: id(),
  songId: text("song_id")
    .notNull()
    .references(() => songs.id),
  mediaType: text("media_type").notNull(),
  bytes: blob("bytes", { mode: "buffer" }).notNull(),
});

/** Immutable; a correction adds a row and moves `songs.currentBeatMapId`. */
export const beatMaps = sqliteTable("beat_maps", {
  id: id(),
  songId: text("song_id")
    .notNull()
    .references(() => songs.id),
  number: integer("number").notNull(),
  beatMap: text("beat_map", { mode: "json" }).$type<BeatMap>().notNull(),
  createdAt: instant("created_at").notNull(),
});

export const seasons = sqliteTable("seasons", {
  id: id(),
  squareId: text("square_id")
    .notNull()
    .references(() => squares.id),
  name: text("name").notNull(),
  /** Local calendar dates of the event's zone. */
  firstDate: text("first_date").notNull(),
  lastDate: text("last_date").notNull(),
  times: text("times", { mode: "json" }).$type<string[]>().notNull(),
});

export const nights = sqliteTable(
  "nights",
  {
    id: id(),
    seasonId: text("season_id")
      .notNull()
      .references(() => seasons.id),
    date: text("date").notNull(),
    opensAt: text("opens_at").notNull(),
    closesAt: text("closes_at").notNull(),
    closedReason: text("closed_reason"),
  },
  (table) => [uniqueIndex("nights_date").on(table.seasonId, table.date)],
);

/** A show sent to the event. `submissionId` and `versionId` are plain ids to keep event free of classroom tables. */
export const forwards = sqliteTable(
  "forwards",
  {
    id: id(),
    submissionId: text("submission_id").notNull(),
    versionId: text("version_id").notNull(),
    note: text("note").notNull(),
    forwardedBy: text("forwarded_by")
      .notNull()
      .references(() => users.id),
    forwardedAt: instant("forwarded_at").notNull(),
    /** `scheduled` is derived: approved and placed in a night. */
    state: text("state").$type<Exclude<ForwardState, "scheduled">>().notNull(),
    answer: text("answer"),
    answeredBy: text("answered_by").references(() => users.id),
    answeredAt: instant("answered_at"),
  },
  (table) => [index("forwards_submission").on(table.submissionId)],
);

export const slots = sqliteTable(
  "slots",
  {
    id: id(),
    nightId: text("night_id")
      .notNull()
      .references(() => nights.id),
    startsAt: text("starts_at").notNull(),
    forwardId: text("forward_id")
      .notNull()
      .references(() => forwards.id),
    isPinned: integer("is_pinned", { mode: "boolean" }).notNull().default(false),
  },
  // One show at one time: the database itself refuses double booking.
  (table) => [uniqueIndex("slots_time").on(table.nightId, table.startsAt)],
);

/** What a family sees of a slot, frozen at publication. */
export interface PublishedSlot {
  readonly slotId: string;
  readonly forwardId: string;
  readonly versionId: string;
  readonly runId: string;
  readonly nightId: string;
  readonly date: string;
  readonly startsAt: string;
  readonly title: string;
  readonly publicName: string;
  readonly schoolName: string;
  readonly songTitle: string;
  readonly seconds: number;
  readonly description: string;
}

/** Immutable: each publication is a whole plan. */
export const lineupPublications = sqliteTable("lineup_publications", {
  id: id(),
  seasonId: text("season_id")
    .notNull()
    .references(() => seasons.id),
  number: integer("number").notNull(),
  nights: text("nights", { mode: "json" }).$type<{ date: string; closedReason: string | null }[]>().notNull(),
  slots: text("slots", { mode: "json" }).$type<PublishedSlot[]>().notNull(),
  publishedBy: text("published_by")
    .notNull()
    .references(() => users.id),
  publishedAt: instant("published_at").notNull(),
});

/** Whether a student's display name may be public. No row: the class is named instead. */
export const consents = sqliteTable("consents", {
  userId: text("user_id")
    .primaryKey()
    .references(() => users.id, { onDelete: "cascade" }),
  isNamePublic: integer("is_name_public", { mode: "boolean" }).notNull(),
  recordedBy: text("recorded_by").references(() => users.id),
  recordedAt: instant("recorded_at").notNull(),
});
