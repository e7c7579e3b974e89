import {
  date,
  doublePrecision,
  index,
  integer,
  jsonb,
  pgTable,
  primaryKey,
  text,
  uuid,
} from "drizzle-orm/pg-core";
import type { LiftEdit, RepMaxFormula } from "../../lib/engine/prescription/types";
import { athletes } from "./athletes";
import { camps, itemEnum } from "./camps";
import { createdAt, id, instant } from "./columns";
import { teams, users } from "./teams";

/** Bests of one lift, measured or estimated from a rep record; the newest on a day counts. */
export const bests = pgTable(
  "bests",
  {
    id: id(),
    teamId: uuid()
      .notNull()
      .references(() => teams.id, { onDelete: "cascade" }),
    athleteId: uuid()
      .notNull()
      .references(() => athletes.id, { onDelete: "cascade" }),
    exerciseId: text().notNull(),
    day: date({ mode: "string" }).notNull(),
    /** What was lifted, kilograms, for so many repetitions. */
    liftedKg: doublePrecision().notNull(),
    reps: integer().notNull(),
    /** Null where it was measured: one repetition. */
    formula: text().$type<RepMaxFormula>(),
    /** The best itself, kilograms. */
    kg: doublePrecision().notNull(),
    userId: uuid().references(() => users.id, { onDelete: "set null" }),
    createdAt: createdAt(),
    removedAt: instant(),
  },
  (t) => [index("bests_athlete").on(t.teamId, t.athleteId, t.day)],
);

/** One exercise instead of another for all sessions of an item in a camp. */
export const swaps = pgTable(
  "swaps",
  {
    teamId: uuid()
      .notNull()
      .references(() => teams.id, { onDelete: "cascade" }),
    campId: uuid()
      .notNull()
      .references(() => camps.id, { onDelete: "cascade" }),
    item: itemEnum().notNull(),
    fromExercise: text().notNull(),
    toExercise: text().notNull(),
    userId: uuid().references(() => users.id, { onDelete: "set null" }),
    createdAt: createdAt(),
  },
  (t) => [primaryKey({ columns: [t.campId, t.item, t.fromExercise] })],
);

/** What a coach wrote over the prescription of one lifting session; hangs on the lift's identity. */
export const liftEdits = pgTable(
  "lift_edits",
  {
    teamId: uuid()
      .notNull()
      .references(() => teams.id, { onDelete: "cascade" }),
    campId: uuid()
      .notNull()
      .references(() => camps.id, { onDelete: "cascade" }),
    liftId: text().notNull(),
    edit: jsonb().$type<LiftEdit>().notNull(),
    userId: uuid().references(() => users.id, { onDelete: "set null" }),
    changedAt: instant().notNull(),
  },
  (t) => [primaryKey({ columns: [t.campId, t.liftId] })],
);
