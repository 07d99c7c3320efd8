import { sql } from "drizzle-orm";
import { index, integer, primaryKey, sqliteTable, text, uniqueIndex } from "drizzle-orm/sqlite-core";
import type { Role } from "../../../shared/roles.ts";
import { id, instant } from "./columns.ts";

export const schools = sqliteTable("schools", {
  id: id(),
  name: text("name").notNull().unique(),
  /** For public names: "Tarn Road". */
  shortName: text("short_name").notNull(),
  timeZone: text("time_zone").notNull(),
});

/** People. Students have no e-mail; staff have no username. `secretHash` is argon2id of passphrase or password. */
export const users = sqliteTable(
  "users",
  {
    id: id(),
    schoolId: text("school_id").references(() => schools.id),
    displayName: text("display_name").notNull(),
    username: text("username"),
    email: text("email"),
    secretHash: text("secret_hash"),
    isDisabled: integer("is_disabled", { mode: "boolean" }).notNull().default(false),
    createdAt: instant("created_at").notNull(),
    lastSeenAt: instant("last_seen_at"),
  },
  (table) => [uniqueIndex("users_email").on(sql`lower(${table.email})`), index("users_username").on(table.username)],
);

export const userRoles = sqliteTable(
  "user_roles",
  {
    userId: text("user_id")
      .notNull()
      .references(() => users.id, { onDelete: "cascade" }),
    role: text("role").$type<Role>().notNull(),
  },
  (table) => [primaryKey({ columns: [table.userId, table.role] })],
);

/**
 * Sessions. `id` is the SHA-256 of the token in the cookie, so that a copy of the database signs
 * nobody in. `expiresAt` is lucia's own column (unix seconds, the idle end); `endsAt` never moves.
 */
export const sessions = sqliteTable(
  "sessions",
  {
    id: text("id").primaryKey(),
    userId: text("user_id")
      .notNull()
      .references(() => users.id, { onDelete: "cascade" }),
    expiresAt: integer("expires_at").notNull(),
    endsAt: instant("ends_at").notNull(),
    createdAt: instant("created_at").notNull(),
  },
  (table) => [index("sessions_user").on(table.userId)],
);

/** One-time codes with which a student chooses new words. Only the hash is kept. */
export const signInResets = sqliteTable("sign_in_resets", {
  id: id(),
  userId: text("user_id")
    .notNull()
    .references(() => users.id, { onDelete: "cascade" }),
  codeHash: text("code_hash").notNull(),
  expiresAt: instant("expires_at").notNull(),
  usedAt: instant("used_at"),
  madeBy: text("made_by")
    .notNull()
    .references(() => users.id),
});

/** Failed sign-ins by account, for growing waits; cleared by a success. */
export const signInFailures = sqliteTable("sign_in_failures", {
  accountKey: text("account_key").primaryKey(),
  count: integer("count").notNull(),
  lastAt: instant("last_at").notNull(),
});

/** Append-only (triggers refuse change); each row's hash covers the row before it. */
export const auditLog = sqliteTable("audit_log", {
  id: integer("id").primaryKey({ autoIncrement: true }),
  at: instant("at").notNull(),
  actorId: text("actor_id"),
  event: text("event").notNull(),
  subject: text("subject"),
  detail: text("detail", { mode: "json" }).$type<Record<string, unknown>>(),
  hash: text("hash").notNull(),
});
