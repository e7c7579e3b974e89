import { z } from "zod";

/** Civil date, `YYYY-MM-DD`, a day that exists. */
export const civilDate = z.iso.date("Give a date as YYYY-MM-DD.");

/** Wall-clock time, `HH:MM`, 00:00 to 23:59. */
export const civilTime = z.string().regex(/^([01]\d|2[0-3]):[0-5]\d$/, "Give a time as HH:MM.");

/** End of a window: `HH:MM` up to 24:00. */
export const civilEndTime = z
  .string()
  .regex(/^(([01]\d|2[0-3]):[0-5]\d|24:00)$/, "Give a time as HH:MM, up to 24:00.");

/** Local date and time without zone, `YYYY-MM-DDTHH:MM`. */
export const civilDateTime = z
  .string()
  .regex(/^\d{4}-\d{2}-\d{2}T([01]\d|2[0-3]):[0-5]\d$/, "Give a local date and time as YYYY-MM-DDTHH:MM.")
  .refine((text) => civilDate.safeParse(text.slice(0, 10)).success, "That day does not exist.");

const knowsZone = (name: string): boolean => {
  try {
    new Intl.DateTimeFormat("en", { timeZone: name });
    return true;
  } catch {
    return false;
  }
};

/** IANA time zone name known to this runtime. */
export const timeZone = z.string().min(1).max(64).refine(knowsZone, "Not a time zone of the IANA database.");
