import { z } from "zod";
import { EQUIPMENT, LIMITATIONS, type Limitation } from "@/lib/engine/prescription/exercise";
import { STRIKING_BASES } from "@/lib/engine/types";
import { athleteFactsSchema, type AthleteFacts } from "./camp-book";
import { civilDate } from "./civil";

const each = <const T extends readonly string[]>(of: T) => z.array(z.enum(of)).max(of.length);
const share = z.number("10 to 90 %.").min(0.1, "10 to 90 %.").max(0.9, "10 to 90 %.");
const PLATE_STEP = "0.5 to 10.";

export const athleteFormSchema = athleteFactsSchema
  .extend({
    name: z.string().trim().min(1, "Give the athlete’s name.").max(120, "At most 120 characters."),
    sport: z.string().trim().max(100, "At most 100 characters."),
    dateOfBirth: civilDate.nullable(),
    /** A second striking base and its share, 0.1 to 0.9; null where there is one base alone. */
    secondBase: z.enum(STRIKING_BASES).nullable(),
    secondShare: share.nullable(),
    /** What hurts or is ruled out. */
    limitations: z.string().trim().max(2000, "At most 2000 characters."),
    /** The same from a closed list: exercises are chosen by it. */
    limitationCodes: each(LIMITATIONS),
    /** What the athlete can train with; the floor is always there. */
    equipment: each(EQUIPMENT),
    plateUnit: z.enum(["kg", "lb"]),
    /** Smallest change of load, both sides of a bar together, in the unit. */
    plateStep: z.number(PLATE_STEP).min(0.5, PLATE_STEP).max(10, PLATE_STEP),
  })
  .refine((form) => form.secondBase !== form.strikingBase, {
    path: ["secondBase"],
    message: "Another one than the first.",
  })
  .refine((form) => (form.secondBase === null) === (form.secondShare === null), {
    path: ["secondShare"],
    message: "A second base has a share, and only a second base.",
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

/** Limitations as they stood from an instant on. */
export interface LimitationsSince {
  readonly id: string;
  readonly since: string;
  readonly by: string | null;
  readonly limitations: string;
  readonly limitationCodes: readonly Limitation[];
}

export interface AthleteView extends AthleteForm {
  readonly id: string;
  readonly minor: boolean;
  readonly holds: readonly HoldDetail[];
  /** Newest first; empty while they were never changed. */
  readonly limitationHistory: readonly LimitationsSince[];
}
