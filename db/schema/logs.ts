import {
  boolean,
  date,
  doublePrecision,
  index,
  integer,
  jsonb,
  pgEnum,
  pgTable,
  primaryKey,
  smallint,
  text,
  uuid,
} from "drizzle-orm/pg-core";
import type { PrescribedLift } from "../../lib/engine/prescription/types";
import { athletes } from "./athletes";
import { camps } from "./camps";
import { createdAt, id, instant } from "./columns";
import { teams, users } from "./teams";

export const logStateEnum = pgEnum("log_state", ["open", "done", "missed"]);

/** What an athlete answered for one session of a camp. Identity is (camp, session). */
export const sessionLogs = pgTable(
  "session_logs",
  {
    teamId: uuid()
      .notNull()
      .references(() => teams.id, { onDelete: "cascade" }),
    campId: uuid()
      .notNull()
      .references(() => camps.id, { onDelete: "cascade" }),
    athleteId: uuid()
      .notNull()
      .references(() => athletes.id, { onDelete: "cascade" }),
    sessionId: text().notNull(),
    day: date({ mode: "string" }).notNull(),
    state: logStateEnum().notNull(),
    /** Session effort, CR-10 (Foster 2001). Null while it was not given. */
    effort: doublePrecision(),
    minutes: integer(),
    /** Hard rounds done, for sparring. */
    hardRounds: integer(),
    /** A knock to the head was reported. */
    knock: boolean().notNull().default(false),
    painPlace: text().notNull().default(""),
    /** 0 to 10; null where no pain was flagged. */
    pain: smallint(),
    note: text().notNull().default(""),
    /** What was asked for when it was first logged: planned against done must not change under it. */
    prescribed: jsonb().$type<PrescribedLift>(),
    /** Rises with each accepted write; a device that edits an older one is told. */
    version: integer().notNull().default(1),
    /** Idempotency keys of the last writes, newest first: a retry from a phone changes nothing. */
    keys: jsonb().$type<string[]>().notNull().default([]),
    loggedAt: instant().notNull(),
    changedAt: instant().notNull(),
  },
  (t) => [
    primaryKey({ columns: [t.campId, t.sessionId] }),
    index("session_logs_athlete_day").on(t.teamId, t.athleteId, t.day),
    index("session_logs_team_day").on(t.teamId, t.day),
  ],
);

/** One set as done. */
export const loggedSets = pgTable(
  "logged_sets",
  {
    teamId: uuid()
      .notNull()
      .references(() => teams.id, { onDelete: "cascade" }),
    campId: uuid()
      .notNull()
      .references(() => camps.id, { onDelete: "cascade" }),
    athleteId: uuid()
      .notNull()
      .references(() => athletes.id, { onDelete: "cascade" }),
    sessionId: text().notNull(),
    /** Slot of the prescription, and number of the set in it from 1. */
    slot: text().notNull(),
    number: smallint().notNull(),
    exerciseId: text().notNull(),
    day: date({ mode: "string" }).notNull(),
    /** Null for body mass. */
    kg: doublePrecision(),
    /** Repetitions, or seconds of a hold. */
    reps: smallint().notNull(),
    /** Repetitions in reserve as felt; null where not given. */
    reserve: smallint(),
  },
  (t) => [
    primaryKey({ columns: [t.campId, t.sessionId, t.slot, t.number] }),
    index("logged_sets_exercise").on(t.athleteId, t.exerciseId, t.day),
  ],
);

/** Four answers, 1 (very good) to 7 (very poor), one a day. */
export const checkIns = pgTable(
  "check_ins",
  {
    teamId: uuid()
      .notNull()
      .references(() => teams.id, { onDelete: "cascade" }),
    athleteId: uuid()
      .notNull()
      .references(() => athletes.id, { onDelete: "cascade" }),
    day: date({ mode: "string" }).notNull(),
    sleep: smallint().notNull(),
    fatigue: smallint().notNull(),
    soreness: smallint().notNull(),
    stress: smallint().notNull(),
    changedAt: instant().notNull(),
  },
  (t) => [primaryKey({ columns: [t.athleteId, t.day] }), index("check_ins_team_day").on(t.teamId, t.day)],
);

export const weights = pgTable(
  "weights",
  {
    teamId: uuid()
      .notNull()
      .references(() => teams.id, { onDelete: "cascade" }),
    athleteId: uuid()
      .notNull()
      .references(() => athletes.id, { onDelete: "cascade" }),
    day: date({ mode: "string" }).notNull(),
    kg: doublePrecision().notNull(),
    changedAt: instant().notNull(),
  },
  (t) => [primaryKey({ columns: [t.athleteId, t.day] }), index("weights_team_day").on(t.teamId, t.day)],
);

export const requestStateEnum = pgEnum("request_state", ["asked", "accepted", "declined", "withdrawn"]);

/** An athlete cannot make a session and asks the coach. */
export const requests = pgTable(
  "requests",
  {
    id: id(),
    teamId: uuid()
      .notNull()
      .references(() => teams.id, { onDelete: "cascade" }),
    campId: uuid()
      .notNull()
      .references(() => camps.id, { onDelete: "cascade" }),
    athleteId: uuid()
      .notNull()
      .references(() => athletes.id, { onDelete: "cascade" }),
    sessionId: text().notNull(),
    reason: text().notNull(),
    state: requestStateEnum().notNull().default("asked"),
    answer: text().notNull().default(""),
    answeredBy: uuid().references(() => users.id, { onDelete: "set null" }),
    answeredAt: instant(),
    createdAt: createdAt(),
  },
  (t) => [index("requests_team_state").on(t.teamId, t.state), index("requests_camp").on(t.campId)],
);

export const decisionEnum = pgEnum("decision", ["accepted", "dismissed"]);

/** What staff decided on a suggestion; the suggestion itself is computed from what was logged. */
export const suggestionDecisions = pgTable(
  "suggestion_decisions",
  {
    teamId: uuid()
      .notNull()
      .references(() => teams.id, { onDelete: "cascade" }),
    campId: uuid()
      .notNull()
      .references(() => camps.id, { onDelete: "cascade" }),
    /** Deterministic key of the engine's suggestion. */
    key: text().notNull(),
    decision: decisionEnum().notNull(),
    title: text().notNull(),
    reason: text().notNull().default(""),
    /** The revision that an accepted change made; null where it changes nothing. */
    revision: integer(),
    userId: uuid().references(() => users.id, { onDelete: "set null" }),
    createdAt: createdAt(),
  },
  (t) => [primaryKey({ columns: [t.campId, t.key] })],
);
