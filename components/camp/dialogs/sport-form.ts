import { z } from "zod";
import { dayFromIso, weekdayOf } from "@/lib/engine/geometry";
import type { SportEntry } from "@/lib/schemas/camp-book";
import { changeScope, sportValuesSchema, type SportValues } from "@/lib/schemas/change";
import { civilDate } from "@/lib/schemas/civil";
import { readWeekly, weeklyRule } from "../details/recurrence";

/** The form of a sport session. `own` keeps a rule that says more than the form can. */
export const sportFormSchema = sportValuesSchema
  .omit({ rrule: true })
  .extend({
    scope: changeScope,
    repeats: z.enum(["once", "weekly", "own"]),
    weekdays: z.array(z.int()),
    until: z.union([z.literal(""), civilDate]),
  })
  .refine((form) => form.repeats !== "weekly" || form.until === "" || form.until >= form.date, {
    path: ["until"],
    message: "The last day must not be before the first.",
  });
export type SportForm = z.infer<typeof sportFormSchema>;

/** The rule that the form describes; `own` is the rule it was opened with. */
export function ruleOfForm(form: SportForm, boutDate: string, own: string | null): string | null {
  if (form.repeats === "own") return own;
  if (form.repeats === "once") return null;
  return weeklyRule({ weekdays: form.weekdays, until: form.until || null }, form.date, boutDate);
}

export const valuesOfForm = (form: SportForm, boutDate: string, own: string | null): SportValues => ({
  kind: form.kind,
  title: form.title,
  date: form.date,
  start: form.start,
  minutes: form.minutes,
  effort: form.effort,
  place: form.place,
  rrule: ruleOfForm(form, boutDate, own),
});

/** How a rule stands in the form. */
export function repeatsOf(
  rrule: string | null,
  date: string,
  boutDate: string,
): Pick<SportForm, "repeats" | "weekdays" | "until"> {
  const own = [weekdayOf(dayFromIso(date))];
  if (rrule === null) return { repeats: "once", weekdays: own, until: "" };
  const weekly = readWeekly(rrule, date, boutDate);
  if (!weekly) return { repeats: "own", weekdays: own, until: "" };
  return { repeats: "weekly", weekdays: [...weekly.weekdays], until: weekly.until ?? "" };
}

/** What of the form differs from the session as it stands; the rule counts only where more than this one changes. */
export function editedValues(
  form: SportForm,
  before: SportValues,
  entry: SportEntry,
  boutDate: string,
): Partial<SportValues> {
  const after = valuesOfForm(form, boutDate, entry.rrule);
  const { rrule, ...facts } = after;
  const changed = Object.fromEntries(
    Object.entries(facts).filter(([name, value]) => before[name as keyof SportValues] !== value),
  ) as Partial<SportValues>;
  const old = repeatsOf(entry.rrule, before.date, boutDate);
  const sameRule =
    old.repeats === form.repeats &&
    old.until === form.until &&
    [...old.weekdays].sort().join() === [...form.weekdays].sort().join();
  const rulesCount = entry.rrule === null || form.scope !== "this";
  return rulesCount && !sameRule ? { ...changed, rrule } : changed;
}
