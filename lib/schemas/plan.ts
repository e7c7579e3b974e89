import { z } from "zod";
import { HOUSE_RULES, RULE_KEYS } from "@/lib/engine";
import { ITEMS } from "@/lib/engine/types";
import { athleteFactsSchema, campWeeks, sportKind, weighInSchema } from "./camp-book";
import { civilDate, civilDateTime, civilTime, timeZone } from "./civil";

/** Body of `POST /api/plan`. Everything is checked here; the planner keeps nothing. */

const houseRules = z.record(z.string(), z.number()).superRefine((values, context) => {
  for (const [key, value] of Object.entries(values)) {
    const rule = RULE_KEYS.find((known) => known === key);
    if (!rule)
      context.addIssue({ code: "custom", path: [key], message: "There is no house rule of that name." });
    else if (value < HOUSE_RULES[rule].min || value > HOUSE_RULES[rule].max) {
      context.addIssue({
        code: "custom",
        path: [key],
        message: `${HOUSE_RULES[rule].min} to ${HOUSE_RULES[rule].max} ${HOUSE_RULES[rule].unit}.`,
      });
    }
  }
});

/** CR-10 effort where none is given (Kirk et al. 2021 for sparring, drills and wrestling; the rest common practice, no published source). */
export const DEFAULT_EFFORT: Record<z.infer<typeof sportKind>, number> = {
  "hard-sparring": 8,
  "technical-sparring": 5,
  skill: 4,
  conditioning: 7,
  travel: 0,
  rest: 0,
  other: 3,
};

export const planRequestSchema = z.strictObject({
  bout: z.strictObject({ date: civilDate, time: civilTime, timeZone }),
  weeks: campWeeks,
  weighIn: weighInSchema.optional(),
  athlete: athleteFactsSchema,
  sport: z
    .array(
      z.strictObject({
        kind: sportKind,
        title: z.string().trim().min(1).max(300),
        start: civilDateTime,
        minutes: z.int().min(1).max(1440),
        effort: z.number().min(0).max(10).optional(),
        rrule: z.string().max(500).optional(),
        exdate: z.array(civilDateTime).max(2000).optional(),
      }),
    )
    .max(500),
  houseRules: houseRules.optional(),
  pins: z
    .array(
      z.strictObject({
        item: z.enum(ITEMS),
        week: z.int().min(0).max(19),
        date: civilDate,
        start: civilTime,
      }),
    )
    .max(100)
    .optional(),
  /** Plan as if it were this day, 00:00 in the bout's zone. */
  today: civilDate.optional(),
});
export type PlanRequest = z.infer<typeof planRequestSchema>;

const reason = z.object({ rule: z.string(), text: z.string() });
const phase = z.enum(["foundation", "strength", "power", "taper"]);

export const planAnswerSchema = z.object({
  phases: z.array(z.object({ phase, from: civilDate, to: civilDate })),
  lifting: z.array(
    z.object({
      id: z.string(),
      week: z.int(),
      item: z.enum(ITEMS),
      date: civilDate,
      start: civilTime,
      minutes: z.number(),
      sets: z.int(),
      intensity: z.object({ low: z.number(), high: z.number(), of: z.enum(["best", "reserve"]) }),
      effort: z.number(),
      heavyLower: z.boolean(),
      pinned: z.boolean(),
      factors: z.array(z.object({ name: z.string(), value: z.number(), text: z.string() })),
      reasons: z.array(reason),
    }),
  ),
  sport: z.array(
    z.object({
      id: z.string(),
      kind: sportKind,
      title: z.string(),
      date: civilDate,
      start: civilTime,
      minutes: z.number(),
      effort: z.number(),
    }),
  ),
  unplaced: z.array(z.object({ item: z.enum(ITEMS), week: z.int(), rules: z.array(reason) })),
  violations: z.array(
    z.object({ rule: z.string(), ids: z.array(z.string()), date: civilDate, text: z.string() }),
  ),
  weeks: z.array(
    z.object({
      weeksOut: z.int(),
      phase,
      from: civilDate,
      to: civilDate,
      sets: z.int(),
      sportLoad: z.number(),
      liftingLoad: z.number(),
      monotony: z.number().nullable(),
      strain: z.number().nullable(),
    }),
  ),
  form: z.object({
    from: civilDate,
    values: z.array(z.number()),
    stopsHelping: z.number(),
    helpsMost: z.number(),
    note: z.string(),
  }),
});
export type PlanAnswer = z.infer<typeof planAnswerSchema>;
