import { date, doublePrecision, index, pgEnum, pgTable, text, uuid } from "drizzle-orm/pg-core";
import { athletes } from "./athletes";
import { createdAt, id, instant } from "./columns";
import { teams, users } from "./teams";

export const sideEnum = pgEnum("side", ["both", "left", "right"]);

/** One trial of a test. */
export const testTrials = pgTable(
  "test_trials",
  {
    id: id(),
    teamId: uuid()
      .notNull()
      .references(() => teams.id, { onDelete: "cascade" }),
    athleteId: uuid()
      .notNull()
      .references(() => athletes.id, { onDelete: "cascade" }),
    day: date({ mode: "string" }).notNull(),
    /** Test kind of the engine's closed list. */
    kind: text().notNull(),
    side: sideEnum().notNull().default("both"),
    /** In the unit of the kind. */
    value: doublePrecision().notNull(),
    /** A second reading where the kind has one: contact time in ms, load or ball in kg, repetitions. */
    second: doublePrecision(),
    /** Body mass on the day, kg, where power is to be computed. */
    massKg: doublePrecision(),
    note: text().notNull().default(""),
    /** Trials of one upload share it, so that it can be taken back whole. */
    uploadId: uuid(),
    userId: uuid().references(() => users.id, { onDelete: "set null" }),
    createdAt: createdAt(),
    removedAt: instant(),
  },
  (t) => [index("test_trials_athlete").on(t.teamId, t.athleteId, t.kind, t.day)],
);
