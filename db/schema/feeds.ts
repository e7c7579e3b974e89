import { boolean, index, pgEnum, pgTable, text, uuid } from "drizzle-orm/pg-core";
import { athletes } from "./athletes";
import { createdAt, id, instant } from "./columns";
import { teams, users } from "./teams";

export const feedScopeEnum = pgEnum("feed_scope", ["athlete", "team"]);

/** A calendar subscription: the address holds a bearer secret, stored only as its hash. */
export const feeds = pgTable(
  "feeds",
  {
    id: id(),
    teamId: uuid()
      .notNull()
      .references(() => teams.id, { onDelete: "cascade" }),
    userId: uuid()
      .notNull()
      .references(() => users.id, { onDelete: "cascade" }),
    scope: feedScopeEnum().notNull(),
    /** Set for scope `athlete`. */
    athleteId: uuid().references(() => athletes.id, { onDelete: "cascade" }),
    /** Titles without content. */
    discreet: boolean().notNull().default(false),
    /** SHA-256 of the token. */
    tokenHash: text().notNull().unique(),
    createdAt: createdAt(),
    revokedAt: instant(),
    lastReadAt: instant(),
  },
  (t) => [index("feeds_user").on(t.teamId, t.userId)],
);
