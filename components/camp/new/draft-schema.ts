import { z } from "zod";
import {
  athleteFactsSchema,
  boutSchema,
  campWeeks,
  sportEntrySchema,
  weighInSchema,
} from "@/lib/schemas/camp-book";
import { civilTime, timeZone } from "@/lib/schemas/civil";
import type { Draft } from "./draft";

const draftSportSchema = sportEntrySchema
  .pick({ kind: true, title: true, minutes: true, effort: true, place: true })
  .extend({
    on: z.boolean(),
    weekdays: z.array(z.int()).min(1, "Pick at least one day."),
    time: civilTime,
    lastDaysOut: z.int().min(0),
    own: sportEntrySchema.omit({ id: true, series: true, idShift: true }).nullable(),
  });

/** The same limits as the server's, by field of the form. */
export const draftSchema: z.ZodType<Draft, Draft> = z
  .object({
    athleteId: z.string(),
    athleteName: z.string().trim().max(120),
    homeZone: timeZone,
    bout: boutSchema,
    weeks: campWeeks,
    weighIn: weighInSchema.nullable(),
    facts: athleteFactsSchema,
    sport: z.array(draftSportSchema).max(200),
  })
  .refine((draft) => draft.athleteId !== "" || draft.athleteName !== "", {
    path: ["athleteName"],
    message: "Give the athlete’s name.",
  });
