import { sql } from "drizzle-orm";
import {
  bigserial,
  boolean,
  foreignKey,
  index,
  pgPolicy,
  pgTable,
  primaryKey,
  text,
  timestamp,
  uniqueIndex,
  uuid,
} from "drizzle-orm/pg-core";
import type { Role } from "@/lib/notify/roles";
import { createdAt, firmColumn, firmPolicy, instantColumn } from "./columns";
import { firms } from "./firms";

/** A person who signs in. Belongs to no firm by itself: see `members`. No row-level policy, sign-in comes first. */
export const users = pgTable(
  "users",
  {
    id: uuid("id").primaryKey(),
    email: text("email").notNull(),
    name: text("name").notNull(),
    passwordHash: text("password_hash"),
    createdAt: createdAt(),
  },
  (t) => [uniqueIndex("users_email").on(sql`lower(${t.email})`)],
);

/** A person's place in a firm. The person may read their own places before a firm is chosen. */
export const members = pgTable(
  "members",
  {
    firmId: firmColumn().references(() => firms.id),
    userId: uuid("user_id")
      .notNull()
      .references(() => users.id),
    roles: text("roles").array().$type<Role[]>().notNull(),
    registration: text("registration"),
    status: text("status").$type<"active" | "suspended">().notNull().default("active"),
    lastSeenAt: instantColumn("last_seen_at"),
    createdAt: createdAt(),
  },
  (t) => [
    primaryKey({ columns: [t.firmId, t.userId] }),
    index("members_by_user").on(t.userId),
    firmPolicy("members"),
    pgPolicy("members_own", {
      for: "select",
      using: sql`user_id = nullif(current_setting('app.user_id', true), '')::uuid`,
    }),
  ],
).enableRLS();

/** A session. `id` is the SHA-256 of the token in the cookie; the token itself is kept nowhere. */
export const sessions = pgTable(
  "sessions",
  {
    id: text("id").primaryKey(),
    userId: uuid("user_id")
      .notNull()
      .references(() => users.id),
    /** A Date, because the session library compares it. */
    expiresAt: timestamp("expires_at", { withTimezone: true, mode: "date" }).notNull(),
    createdAt: createdAt(),
    lastSeenAt: instantColumn("last_seen_at"),
    device: text("device").notNull().default(""),
  },
  (t) => [index("sessions_by_user").on(t.userId)],
);

/** An invitation to join a firm. Found by the hash of the token in the e-mail, before any firm is known. */
export const invitations = pgTable(
  "invitations",
  {
    firmId: firmColumn().references(() => firms.id),
    id: uuid("id").notNull(),
    email: text("email").notNull(),
    roles: text("roles").array().$type<Role[]>().notNull(),
    tokenHash: text("token_hash").notNull(),
    invitedBy: uuid("invited_by").notNull(),
    expiresAt: instantColumn("expires_at").notNull(),
    acceptedAt: instantColumn("accepted_at"),
    withdrawnAt: instantColumn("withdrawn_at"),
    createdAt: createdAt(),
  },
  (t) => [
    primaryKey({ columns: [t.firmId, t.id] }),
    uniqueIndex("invitations_token").on(t.tokenHash),
    foreignKey({ columns: [t.firmId, t.invitedBy], foreignColumns: [members.firmId, members.userId] }),
    firmPolicy("invitations"),
    pgPolicy("invitations_by_token", {
      for: "select",
      using: sql`token_hash = nullif(current_setting('app.token_hash', true), '')`,
    }),
  ],
).enableRLS();

export const passwordResets = pgTable(
  "password_resets",
  {
    id: uuid("id").primaryKey(),
    userId: uuid("user_id")
      .notNull()
      .references(() => users.id),
    tokenHash: text("token_hash").notNull(),
    expiresAt: instantColumn("expires_at").notNull(),
    usedAt: instantColumn("used_at"),
    createdAt: createdAt(),
  },
  (t) => [uniqueIndex("password_resets_token").on(t.tokenHash), index("password_resets_by_user").on(t.userId)],
);

/** One guess at a password. `account` is a hash of the e-mail address, known or not. */
export const signInAttempts = pgTable(
  "sign_in_attempts",
  {
    id: bigserial("id", { mode: "number" }).primaryKey(),
    account: text("account").notNull(),
    at: instantColumn("at")
      .notNull()
      .default(sql`now()`),
    succeeded: boolean("succeeded").notNull().default(false),
  },
  (t) => [index("sign_in_attempts_recent").on(t.account, t.at)],
);
