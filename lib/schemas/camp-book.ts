import { z } from "zod";
import { ITEMS, SPORT_KINDS, STRIKING_BASES, TRAINING_AGES } from "@/lib/engine/types";
import { civilDate, civilDateTime, civilEndTime, civilTime, timeZone } from "./civil";

/**
 * The camp book: everything people decide about one camp. The plan is computed from it and never edited by hand.
 * Dates and times are civil (wall clock); `lib/book` turns a book into the engine's input.
 */

export const sportKind = z.enum(SPORT_KINDS);

export const freeHoursSchema = z
  .object({ weekday: z.int().min(1).max(7), from: civilTime, to: civilEndTime })
  .refine((hours) => hours.from < hours.to, { path: ["to"], message: "The end must be after the start." });

/** One line of the sport timetable of a camp: a single session or a recurring one. */
export const sportEntrySchema = z.object({
  id: z.string().min(1).max(80),
  /**
   * Root of the identity of its occurrences: an occurrence of a recurring entry is `series@YYYY-MM-DD`, where the date
   * is the occurrence's own less `idShift` days. Entries split from one series share it, so that a move stays a move.
   */
  series: z.string().min(1).max(80),
  idShift: z.int(),
  kind: sportKind,
  title: z.string().trim().min(1, "Give the session a name.").max(300),
  start: civilDateTime,
  minutes: z.int("Give whole minutes.").min(1, "At least 1 minute.").max(1440, "At most 24 hours."),
  effort: z.number("0 to 10.").min(0, "0 to 10.").max(10, "0 to 10."),
  place: z.string().trim().max(200),
  /** RFC 5545 RRULE value without the name, or null for a single session. */
  rrule: z.string().max(500).nullable(),
  /** Local starts left out of the recurrence. */
  exdate: z.array(civilDateTime).max(2000),
});
export type SportEntry = z.infer<typeof sportEntrySchema>;

export const athleteFactsSchema = z.object({
  trainingAge: z.enum(TRAINING_AGES),
  liftsPerWeek: z.int().min(1, "1 to 4.").max(4, "1 to 4."),
  strikingBase: z.enum(STRIKING_BASES),
  freeHours: z.array(freeHoursSchema).max(50),
});
export type AthleteFacts = z.infer<typeof athleteFactsSchema>;

export const boutSchema = z.object({
  date: civilDate,
  time: civilTime,
  /** The venue's. */
  timeZone,
  place: z.string().trim().max(200),
  opponent: z.string().trim().max(200),
  ruleset: z.string().trim().max(100),
  rounds: z.int().min(1).max(15).nullable(),
  roundMinutes: z.number().min(0.5).max(15).nullable(),
  /** Weight limit in kilograms. */
  limitKg: z.number().min(30, "30 to 250 kg.").max(250, "30 to 250 kg.").nullable(),
});
export type Bout = z.infer<typeof boutSchema>;

export const weighInSchema = z.object({ date: civilDate, time: civilTime });

export const campWeeks = z.int("A whole number of weeks.").min(1, "1 to 20 weeks.").max(20, "1 to 20 weeks.");

export const pinSchema = z.object({
  liftId: z.string().min(1).max(60),
  item: z.enum(ITEMS),
  week: z.int().min(0).max(19),
  date: civilDate,
  start: civilTime,
});
export type BookPin = z.infer<typeof pinSchema>;

/** Coach's own factor on a session's sets. */
export const coachFactor = z.number().min(0.5, "0.5 to 1.5.").max(1.5, "0.5 to 1.5.");

export const campResponseFields = {
  /** Key of the suggestion that was accepted. */
  id: z.string().min(1).max(120),
  from: civilDate,
  /** Inclusive. */
  to: civilDate,
  factor: z.number("0.5 to 1.").min(0.5, "0.5 to 1.").max(1, "0.5 to 1."),
  because: z.string().trim().max(300, "At most 300 characters."),
};
/** For a refinement: the first of two dates is not after the last. */
export const datesInOrder = ({ from, to }: { from: string; to: string }): boolean => from <= to;
export const DATES_IN_ORDER = { path: ["to"], message: "The last day must not be before the first." };

/** An accepted suggestion: sets of the lifting in these days are lowered by the factor. */
export const campResponseSchema = z.object(campResponseFields).refine(datesInOrder, DATES_IN_ORDER);
export type CampResponse = z.infer<typeof campResponseSchema>;

/** A medical hold on the clock of the gym. It takes out nothing that began before it was set or after it was lifted. */
export const campHoldSchema = z.object({
  from: civilDate,
  /** Inclusive; null until it is lifted. */
  to: civilDate.nullable(),
  setAt: civilDateTime.optional(),
  liftedAt: civilDateTime.optional(),
});
export type CampHold = z.infer<typeof campHoldSchema>;

export const campBookSchema = z.object({
  status: z.enum(["on", "off"]),
  /** Zone of the gym; sessions are in it until the travel day, in the venue's after. */
  homeZone: timeZone,
  bout: boutSchema,
  weeks: campWeeks,
  weighIn: weighInSchema.nullable(),
  athlete: athleteFactsSchema,
  sport: z.array(sportEntrySchema).max(500),
  pins: z.array(pinSchema).max(100),
  coachFactors: z.record(z.string(), coachFactor),
  responses: z.array(campResponseSchema).max(100),
  holds: z.array(campHoldSchema).max(50),
  /** The team's own values of house rules, by key. */
  rules: z.record(z.string(), z.number()),
});
export type CampBook = z.infer<typeof campBookSchema>;
