import {
  date,
  doublePrecision,
  index,
  integer,
  jsonb,
  pgEnum,
  pgTable,
  text,
  uuid,
} from "drizzle-orm/pg-core";
import { EQUIPMENT, type Equipment, type Limitation } from "../../lib/engine/prescription/exercise";
import { STRIKING_BASES, TRAINING_AGES } from "../../lib/engine/types";
import { createdAt, id, instant, unitsEnum } from "./columns";
import { teams, users } from "./teams";

export const trainingAgeEnum = pgEnum("training_age", [...TRAINING_AGES]);
export const strikingBaseEnum = pgEnum("striking_base", [...STRIKING_BASES]);

/** `from`, `to` are HH:MM, `to` up to 24:00; weekday 1 is Monday. */
export interface FreeHoursRow {
  weekday: number;
  from: string;
  to: string;
}

export const athletes = pgTable(
  "athletes",
  {
    id: id(),
    teamId: uuid()
      .notNull()
      .references(() => teams.id, { onDelete: "cascade" }),
    name: text().notNull(),
    dateOfBirth: date({ mode: "string" }),
    sport: text().notNull().default(""),
    trainingAge: trainingAgeEnum().notNull(),
    strikingBase: strikingBaseEnum().notNull(),
    liftsPerWeek: integer().notNull(),
    freeHours: jsonb().$type<FreeHoursRow[]>().notNull(),
    /** A second striking base and its share, 0.1 to 0.9; null where there is one base alone. */
    secondBase: strikingBaseEnum(),
    secondShare: doublePrecision(),
    /** What hurts or is ruled out, in the athlete's words. */
    limitations: text().notNull().default(""),
    /** The same from a closed list, which exercises are chosen by. */
    limitationCodes: jsonb().$type<Limitation[]>().notNull().default([]),
    /** What the athlete can train with. */
    equipment: jsonb()
      .$type<Equipment[]>()
      .notNull()
      .default([...EQUIPMENT]),
    /** Smallest change of load, both sides of a bar together, in the unit. */
    plateUnit: unitsEnum().notNull().default("kg"),
    plateStep: doublePrecision().notNull().default(2.5),
    createdAt: createdAt(),
  },
  (t) => [index("athletes_team").on(t.teamId)],
);

/** A medical hold: nothing is planned from `fromDay` to `toDay`; only the medic sets and lifts it. */
export const holds = pgTable(
  "holds",
  {
    id: id(),
    teamId: uuid()
      .notNull()
      .references(() => teams.id, { onDelete: "cascade" }),
    athleteId: uuid()
      .notNull()
      .references(() => athletes.id, { onDelete: "cascade" }),
    fromDay: date({ mode: "string" }).notNull(),
    /** Null: until the medic lifts it. */
    toDay: date({ mode: "string" }),
    /** Medical note: seen by the medic and the athlete alone. */
    reason: text().notNull(),
    setBy: uuid().references(() => users.id, { onDelete: "set null" }),
    createdAt: createdAt(),
    liftedAt: instant(),
  },
  (t) => [index("holds_athlete").on(t.teamId, t.athleteId)],
);

/** What an athlete's limitations were before each edit, append only. */
export const limitationHistory = pgTable(
  "limitation_history",
  {
    id: id(),
    teamId: uuid()
      .notNull()
      .references(() => teams.id, { onDelete: "cascade" }),
    athleteId: uuid()
      .notNull()
      .references(() => athletes.id, { onDelete: "cascade" }),
    limitations: text().notNull(),
    limitationCodes: jsonb().$type<Limitation[]>().notNull(),
    userId: uuid().references(() => users.id, { onDelete: "set null" }),
    /** Since when they stand. */
    createdAt: createdAt(),
  },
  (t) => [index("limitation_history_athlete").on(t.teamId, t.athleteId, t.createdAt)],
);
