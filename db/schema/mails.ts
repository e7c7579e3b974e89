import { index, integer, jsonb, pgEnum, pgTable, text, unique, uuid } from "drizzle-orm/pg-core";
import { camps } from "./camps";
import { createdAt, id, instant } from "./columns";
import { teams, users } from "./teams";

/** A person to be told of one saved revision; collected into one mail by `collectKey`. Deleted never, marked when mailed. */
export const notices = pgTable(
  "notices",
  {
    id: id(),
    teamId: uuid()
      .notNull()
      .references(() => teams.id, { onDelete: "cascade" }),
    userId: uuid()
      .notNull()
      .references(() => users.id, { onDelete: "cascade" }),
    campId: uuid()
      .notNull()
      .references(() => camps.id, { onDelete: "cascade" }),
    revision: integer().notNull(),
    createdAt: createdAt(),
    /** The mail that carried it. */
    mailId: uuid().references(() => mails.id, { onDelete: "set null" }),
  },
  (t) => [
    unique("notices_once").on(t.userId, t.campId, t.revision),
    index("notices_waiting").on(t.userId, t.mailId),
  ],
);

export const mailStatusEnum = pgEnum("mail_status", ["waiting", "sent", "failed", "withheld"]);

/** Every mail the application sends, written before it is sent: `messageId` is fixed, so a retry is the same message. */
export const mails = pgTable(
  "mails",
  {
    id: id(),
    /** Null for mails that belong to no team (password reset). */
    teamId: uuid().references(() => teams.id, { onDelete: "cascade" }),
    userId: uuid().references(() => users.id, { onDelete: "cascade" }),
    recipient: text().notNull(),
    kind: text().notNull(),
    /** Deduplicates: the same key is one mail. */
    key: text().notNull().unique(),
    messageId: text().notNull().unique(),
    subject: text().notNull(),
    text: text().notNull(),
    html: text().notNull(),
    headers: jsonb().$type<Record<string, string>>().notNull().default({}),
    status: mailStatusEnum().notNull().default("waiting"),
    attempts: integer().notNull().default(0),
    createdAt: createdAt(),
    sentAt: instant(),
  },
  (t) => [index("mails_user").on(t.userId), index("mails_status").on(t.status)],
);
