import { z } from "zod";
import { ITEMS } from "@/lib/engine/types";
import {
  DATES_IN_ORDER,
  boutSchema,
  campResponseFields,
  campWeeks,
  coachFactor,
  datesInOrder,
  sportEntrySchema,
  sportKind,
  weighInSchema,
} from "./camp-book";
import { civilDate, civilTime } from "./civil";

/**
 * A change is data: one value drives drag, keyboard, form, API, preview, revision, undo and mail.
 * It says what a person decided, not what it knocks on to; that is computed.
 */

/** Which occurrences of a recurring session: this one, this and following, all that are not past. */
export const changeScope = z.enum(["this", "following", "all"]);
export type ChangeScope = z.infer<typeof changeScope>;

/** What a sport session may be given; `rrule` null makes it a single session. */
export const sportValuesSchema = sportEntrySchema
  .pick({ title: true, minutes: true, effort: true, place: true, rrule: true })
  .extend({ kind: sportKind, date: civilDate, start: civilTime });
export type SportValues = z.infer<typeof sportValuesSchema>;

export const changeSchema = z.discriminatedUnion("kind", [
  /** Puts a lifting session on a day and time: pins it. */
  z.object({
    kind: z.literal("lift.move"),
    liftId: z.string().min(1).max(60),
    item: z.enum(ITEMS),
    week: z.int().min(0).max(19),
    date: civilDate,
    start: civilTime,
  }),
  /** Lifts the pin, so that the engine places it again. */
  z.object({ kind: z.literal("lift.release"), liftId: z.string().min(1).max(60) }),
  z.object({ kind: z.literal("lift.factor"), liftId: z.string().min(1).max(60), factor: coachFactor }),
  /** Accepts a suggestion: the lifting of these days gets fewer sets. */
  z.object({ kind: z.literal("response.add"), ...campResponseFields }).refine(datesInOrder, DATES_IN_ORDER),
  z.object({ kind: z.literal("response.drop"), id: campResponseFields.id }),
  z.object({ kind: z.literal("sport.add"), entryId: z.uuid(), values: sportValuesSchema }),
  /** Also a move: only `date` and `start` given. */
  z.object({
    kind: z.literal("sport.edit"),
    sportId: z.string().min(1).max(100),
    scope: changeScope,
    values: sportValuesSchema.partial(),
  }),
  z.object({ kind: z.literal("sport.drop"), sportId: z.string().min(1).max(100), scope: changeScope }),
  z.object({
    kind: z.literal("bout.change"),
    bout: boutSchema,
    weeks: campWeeks,
    weighIn: weighInSchema.nullable(),
  }),
  z.object({ kind: z.literal("bout.off") }),
  /** Undoes a saved revision as a new one. */
  z.object({ kind: z.literal("put-back"), revision: z.int().min(1) }),
]);
export type Change = z.infer<typeof changeSchema>;
export type ChangeKind = Change["kind"];

export const saveChangeSchema = z.object({
  change: changeSchema,
  baseRevision: z.int().min(0),
  idempotencyKey: z.uuid(),
});
export type SaveChange = z.infer<typeof saveChangeSchema>;
