import { z } from "zod";
import { civilDate } from "./civil";

export const RESULTS = ["won", "lost", "draw", "no-contest"] as const;

/** How a bout ended. `standDownDays` come from the commission or the ringside physician, never from us. */
export const boutResultSchema = z.object({
  result: z.enum(RESULTS),
  /** How, in words: decision, stoppage, submission. */
  how: z.string().trim().max(200, "At most 200 characters."),
  /** Ended by blows to the head or a referee's stop. */
  stopped: z.boolean(),
  /** Days without contact that were ordered; counted from the day after the bout. */
  standDownDays: z.int("Whole days.").min(0, "0 to 730 days.").max(730, "0 to 730 days.").nullable(),
  note: z.string().trim().max(2000, "At most 2000 characters."),
  recordedOn: civilDate,
});
export type BoutResult = z.infer<typeof boutResultSchema>;
