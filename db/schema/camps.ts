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
  text,
  unique,
  uuid,
} from "drizzle-orm/pg-core";
import { SPORT_KINDS, ITEMS } from "../../lib/engine/types";
import type { Lift, Plan, KnockOn } from "../../lib/engine/types";
import type { BookEdit } from "../../lib/book/edit";
import type { CampResponse } from "../../lib/schemas/camp-book";
import type { BoutResult } from "../../lib/schemas/result";
import type { Change } from "../../lib/schemas/change";
import { athletes } from "./athletes";
import { createdAt, id, instant } from "./columns";
import { teams, users } from "./teams";

export const sportKindEnum = pgEnum("sport_kind", [...SPORT_KINDS]);
export const itemEnum = pgEnum("item", [...ITEMS]);
export const campStatusEnum = pgEnum("camp_status", ["on", "off"]);
export const sessionSourceEnum = pgEnum("session_source", ["lift", "sport", "bout", "weigh-in"]);
export const sessionStatusEnum = pgEnum("session_status", ["confirmed", "cancelled"]);

export const camps = pgTable(
  "camps",
  {
    id: id(),
    teamId: uuid()
      .notNull()
      .references(() => teams.id, { onDelete: "cascade" }),
    athleteId: uuid()
      .notNull()
      .references(() => athletes.id, { onDelete: "cascade" }),
    status: campStatusEnum().notNull().default("on"),
    homeZone: text().notNull(),
    boutDate: date({ mode: "string" }).notNull(),
    /** HH:MM at the venue. */
    boutTime: text().notNull(),
    boutZone: text().notNull(),
    place: text().notNull(),
    opponent: text().notNull(),
    ruleset: text().notNull(),
    rounds: integer(),
    roundMinutes: doublePrecision(),
    limitKg: doublePrecision(),
    weighInDate: date({ mode: "string" }),
    weighInTime: text(),
    weeks: integer().notNull(),
    /** Facts of the athlete as of this camp: changing a profile later does not move a running camp silently. */
    trainingAge: text().notNull(),
    strikingBase: text().notNull(),
    liftsPerWeek: integer().notNull(),
    freeHours: jsonb().$type<{ weekday: number; from: string; to: string }[]>().notNull(),
    coachFactors: jsonb().$type<Record<string, number>>().notNull().default({}),
    /** Accepted suggestions that lower the sets of the days that they cover. */
    responses: jsonb().$type<CampResponse[]>().notNull().default([]),
    /** How the bout ended; null before. */
    result: jsonb().$type<BoutResult>(),
    /** Number of the newest revision; optimistic writes carry it. */
    revision: integer().notNull().default(0),
    /** What the plan says besides its sessions: weeks, phases, unplaced, violations, form. */
    summary: jsonb().$type<Omit<Plan, "lifts">>().notNull(),
    createdAt: createdAt(),
    /** Time of the newest revision. */
    changedAt: instant().notNull().defaultNow(),
  },
  (t) => [index("camps_team_bout").on(t.teamId, t.boutDate), index("camps_athlete").on(t.athleteId)],
);

const sportColumns = () => ({
  series: text().notNull(),
  idShift: integer().notNull().default(0),
  kind: sportKindEnum().notNull(),
  title: text().notNull(),
  /** Local, YYYY-MM-DDTHH:MM. */
  start: text().notNull(),
  minutes: integer().notNull(),
  effort: doublePrecision().notNull(),
  place: text().notNull(),
  rrule: text(),
  exdate: jsonb().$type<string[]>().notNull().default([]),
});

/** The gym's week: where a new camp takes its sport sessions from. */
export const timetableEntries = pgTable(
  "timetable_entries",
  {
    id: text().notNull(),
    teamId: uuid()
      .notNull()
      .references(() => teams.id, { onDelete: "cascade" }),
    ...sportColumns(),
  },
  (t) => [primaryKey({ columns: [t.teamId, t.id] })],
);

export const sportEntries = pgTable(
  "sport_entries",
  {
    id: text().notNull(),
    teamId: uuid()
      .notNull()
      .references(() => teams.id, { onDelete: "cascade" }),
    campId: uuid()
      .notNull()
      .references(() => camps.id, { onDelete: "cascade" }),
    ...sportColumns(),
  },
  (t) => [primaryKey({ columns: [t.campId, t.id] })],
);

export const pins = pgTable(
  "pins",
  {
    teamId: uuid()
      .notNull()
      .references(() => teams.id, { onDelete: "cascade" }),
    campId: uuid()
      .notNull()
      .references(() => camps.id, { onDelete: "cascade" }),
    liftId: text().notNull(),
    item: itemEnum().notNull(),
    week: integer().notNull(),
    day: date({ mode: "string" }).notNull(),
    start: text().notNull(),
  },
  (t) => [primaryKey({ columns: [t.campId, t.liftId] })],
);

/** Everything dated in a camp, as planned: what calendars and feeds read. Identity is (camp, id); never deleted, only cancelled. */
export const sessions = pgTable(
  "sessions",
  {
    teamId: uuid()
      .notNull()
      .references(() => teams.id, { onDelete: "cascade" }),
    campId: uuid()
      .notNull()
      .references(() => camps.id, { onDelete: "cascade" }),
    /** Engine id of a lift, occurrence id of a sport session, "bout" or "weigh-in". */
    id: text().notNull(),
    /** UID of the iCalendar event (RFC 7986 5.3: random, no host data). */
    uid: uuid().notNull().defaultRandom().unique(),
    source: sessionSourceEnum().notNull(),
    /** Item of a lift or kind of a sport session. */
    kind: text().notNull(),
    title: text().notNull(),
    place: text().notNull().default(""),
    day: date({ mode: "string" }).notNull(),
    start: text().notNull(),
    minutes: integer().notNull(),
    startsAt: instant().notNull(),
    endsAt: instant().notNull(),
    effort: doublePrecision().notNull(),
    pinned: boolean().notNull().default(false),
    /** The engine's own value of a lift; null for everything else. */
    lift: jsonb().$type<Lift>(),
    status: sessionStatusEnum().notNull().default("confirmed"),
    /** RFC 5545 SEQUENCE: rises on every change of time and on cancelling. */
    sequence: integer().notNull().default(0),
    /** Time of the revision that last touched it: DTSTAMP of the feed. */
    changedAt: instant().notNull(),
  },
  (t) => [
    primaryKey({ columns: [t.campId, t.id] }),
    index("sessions_camp_day").on(t.campId, t.day),
    index("sessions_team_time").on(t.teamId, t.startsAt),
  ],
);

/** One saved change. `edit` did it, `inverse` undoes it. History is never rewritten. */
export const revisions = pgTable(
  "revisions",
  {
    id: id(),
    teamId: uuid()
      .notNull()
      .references(() => teams.id, { onDelete: "cascade" }),
    campId: uuid()
      .notNull()
      .references(() => camps.id, { onDelete: "cascade" }),
    number: integer().notNull(),
    /** Null for the first revision, which lays the camp out. */
    change: jsonb().$type<Change>(),
    edit: jsonb().$type<BookEdit>(),
    inverse: jsonb().$type<BookEdit>(),
    knockOn: jsonb().$type<KnockOn>(),
    /** Lifts as they stood before, for those that this revision moved: where a put-back returns them to. */
    liftsBefore: jsonb().$type<Lift[]>().notNull().default([]),
    /** What was changed, in words, for the list of changes. */
    summary: text().notNull(),
    idempotencyKey: uuid().notNull(),
    userId: uuid().references(() => users.id, { onDelete: "set null" }),
    /** The revision that this one undid. */
    putBackOf: integer(),
    createdAt: createdAt(),
  },
  (t) => [
    unique("revisions_camp_number").on(t.campId, t.number),
    unique("revisions_camp_key").on(t.campId, t.idempotencyKey),
  ],
);
