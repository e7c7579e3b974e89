import { sql } from "drizzle-orm";
import { index, integer, jsonb, pgEnum, pgTable, text, unique, uniqueIndex, uuid } from "drizzle-orm/pg-core";
import { ROLES } from "../../lib/policy/roles";
import { createdAt, id, instant, unitsEnum } from "./columns";
import { athletes } from "./athletes";

/** `each`: one mail a change or burst; `daily`: one a day at 06:00 of the reader's zone; `none`: none. */
export const mailChoiceEnum = pgEnum("mail_choice", ["each", "daily", "none"]);
export const roleEnum = pgEnum("role", [...ROLES]);

export const users = pgTable(
  "users",
  {
    id: id(),
    name: text().notNull(),
    email: text().notNull(),
    /** argon2id, with its parameters in the string. */
    passwordHash: text().notNull(),
    /** Raised on password change and removal: sessions that carry an older one end at once. */
    sessionVersion: integer().notNull().default(1),
    units: unitsEnum().notNull().default("kg"),
    timeZone: text().notNull(),
    mailChoice: mailChoiceEnum().notNull().default("each"),
    /** Team shown after sign-in, where a person is in several. */
    currentTeamId: uuid(),
    createdAt: createdAt(),
  },
  (t) => [uniqueIndex("users_email_lower").on(sql`lower(${t.email})`)],
);

export const teams = pgTable("teams", {
  id: id(),
  name: text().notNull(),
  timeZone: text().notNull(),
  /** The team's own values of house rules by key; everything else is the default. */
  ruleOverrides: jsonb().$type<Record<string, number>>().notNull().default({}),
  createdAt: createdAt(),
});

export const memberships = pgTable(
  "memberships",
  {
    id: id(),
    teamId: uuid()
      .notNull()
      .references(() => teams.id, { onDelete: "cascade" }),
    userId: uuid()
      .notNull()
      .references(() => users.id, { onDelete: "cascade" }),
    role: roleEnum().notNull(),
    /** For athletes and guests: whose data they see. */
    athleteId: uuid().references(() => athletes.id, { onDelete: "set null" }),
    createdAt: createdAt(),
  },
  (t) => [unique("memberships_team_user").on(t.teamId, t.userId), index("memberships_user").on(t.userId)],
);

export const invites = pgTable(
  "invites",
  {
    id: id(),
    teamId: uuid()
      .notNull()
      .references(() => teams.id, { onDelete: "cascade" }),
    email: text().notNull(),
    role: roleEnum().notNull(),
    athleteId: uuid().references(() => athletes.id, { onDelete: "cascade" }),
    /** SHA-256 of the token; the token itself is only in the mail. */
    tokenHash: text().notNull().unique(),
    invitedBy: uuid().references(() => users.id, { onDelete: "set null" }),
    expiresAt: instant().notNull(),
    acceptedAt: instant(),
    createdAt: createdAt(),
  },
  (t) => [index("invites_team").on(t.teamId)],
);

export const resetTokens = pgTable(
  "reset_tokens",
  {
    id: id(),
    userId: uuid()
      .notNull()
      .references(() => users.id, { onDelete: "cascade" }),
    /** SHA-256 of the token. */
    tokenHash: text().notNull().unique(),
    expiresAt: instant().notNull(),
    usedAt: instant(),
    createdAt: createdAt(),
  },
  (t) => [index("reset_tokens_user").on(t.userId)],
);

/** Who did what, append only. */
export const auditLog = pgTable(
  "audit_log",
  {
    id: id(),
    teamId: uuid()
      .notNull()
      .references(() => teams.id, { onDelete: "cascade" }),
    userId: uuid().references(() => users.id, { onDelete: "set null" }),
    action: text().notNull(),
    subject: text().notNull(),
    detail: jsonb().$type<Record<string, unknown>>().notNull().default({}),
    createdAt: createdAt(),
  },
  (t) => [index("audit_log_team_time").on(t.teamId, t.createdAt)],
);
