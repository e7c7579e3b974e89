import { z } from "zod";
import { athleteFactsSchema, type AthleteFacts } from "./camp-book";
import { civilDate } from "./civil";

export const athleteFormSchema = athleteFactsSchema.extend({
  name: z.string().trim().min(1, "Give the athlete’s name.").max(120, "At most 120 characters."),
  sport: z.string().trim().max(100, "At most 100 characters."),
  dateOfBirth: civilDate.nullable(),
  /** What hurts or is ruled out. */
  limitations: z.string().trim().max(2000, "At most 2000 characters."),
});
export type AthleteForm = z.infer<typeof athleteFormSchema>;

export const holdFormSchema = z
  .object({
    from: civilDate,
    /** Null: until the medic lifts it. */
    to: civilDate.nullable(),
    reason: z
      .string()
      .trim()
      .min(1, "Say why, for the athlete and other medics.")
      .max(2000, "At most 2000 characters."),
  })
  .refine((hold) => hold.to === null || hold.from <= hold.to, {
    path: ["to"],
    message: "The last day must not be before the first.",
  });
export type HoldForm = z.infer<typeof holdFormSchema>;

export interface HoldDetail {
  readonly id: string;
  readonly from: string;
  readonly to: string | null;
  /** Null where the reader may not see it. */
  readonly reason: string | null;
  readonly setBy: string | null;
  readonly createdAt: string;
  readonly liftedAt: string | null;
}

export interface AthleteSummary {
  readonly id: string;
  readonly name: string;
  readonly sport: string;
  readonly facts: AthleteFacts;
  /** Weight descent is switched off for a minor. */
  readonly minor: boolean;
  readonly onHold: boolean;
}

export interface AthleteView extends AthleteForm {
  readonly id: string;
  readonly minor: boolean;
  readonly holds: readonly HoldDetail[];
}
