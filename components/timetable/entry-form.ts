import { z } from "zod";
import { dayFromIso, weekdayOf } from "@/lib/engine";
import type { Weekday } from "@/lib/engine/types";
import { sportEntrySchema } from "@/lib/schemas/camp-book";
import { civilDate, civilTime } from "@/lib/schemas/civil";
import { DEFAULT_EFFORT } from "@/lib/schemas/plan";
import type { TimetableEntry, TimetableForm } from "@/lib/schemas/timetable";
import { weeklyOf, weeklyRule } from "./weekly";

/** The form of a session of the gym's week. `own` keeps a rule that says more than the form can. */
export const entryFormSchema = sportEntrySchema
  .pick({ kind: true, title: true, minutes: true, effort: true, place: true })
  .extend({
    date: civilDate,
    time: civilTime,
    repeats: z.enum(["weekly", "once", "own"]),
    weekdays: z.array(z.int()),
    until: z.union([z.literal(""), civilDate]),
  })
  .refine((form) => form.repeats !== "weekly" || form.until === "" || form.until >= form.date, {
    path: ["until"],
    message: "The last day must not be before the first.",
  });
export type EntryForm = z.infer<typeof entryFormSchema>;

const weekdayOfDate = (date: string): Weekday => weekdayOf(dayFromIso(date));

/** A new session, on a day of the week that is given by its next date. */
export const freshEntry = (date: string): EntryForm => ({
  kind: "skill",
  title: "Skill",
  date,
  time: "18:00",
  minutes: 60,
  effort: DEFAULT_EFFORT.skill,
  place: "",
  repeats: "weekly",
  weekdays: [weekdayOfDate(date)],
  until: "",
});

export function formOfEntry(entry: TimetableEntry): EntryForm {
  const { kind, title, minutes, effort, place, start } = entry;
  const [date = "", time = ""] = start.split("T");
  const weekly = weeklyOf(entry);
  return {
    ...{ kind, title, minutes, effort, place, date, time },
    repeats: weekly ? "weekly" : entry.rrule === null ? "once" : "own",
    weekdays: [...(weekly?.weekdays ?? [weekdayOfDate(date)])],
    until: weekly?.until ?? "",
  };
}

/** What the server gets. Days left out of a series (`exdate`) stay with the entry they belong to. */
export function entryOfForm(form: EntryForm, before: TimetableEntry | null): TimetableForm {
  const { kind, title, minutes, effort, place, date, time } = form;
  const start = `${date}T${time}`;
  const weekly = { weekdays: form.weekdays as Weekday[], until: form.until || null };
  const rrule =
    form.repeats === "once"
      ? null
      : form.repeats === "own"
        ? (before?.rrule ?? null)
        : weeklyRule(weekly, start);
  const kept = rrule === null ? [] : (before?.exdate ?? []);
  return { kind, title, minutes, effort, place, start, rrule, exdate: kept };
}
