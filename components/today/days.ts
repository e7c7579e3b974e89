import { dayFromIso, isoFromDay } from "@/lib/engine/geometry";
import type { Day } from "@/lib/engine/types";
import { dayText } from "@/lib/format/civil";
import type { TodayView } from "@/lib/schemas/today";

/** Days between two civil dates. */
const daysBetween = (from: string, to: string): number => dayFromIso(to) - dayFromIso(from);

export const dateAfter = (date: string, days: number): string => isoFromDay((dayFromIso(date) + days) as Day);

/** Date on the wall of this phone. */
export function phoneDate(at: Date): string {
  const two = (value: number): string => String(value).padStart(2, "0");
  return `${at.getFullYear()}-${two(at.getMonth() + 1)}-${two(at.getDate())}`;
}

/**
 * Today, also for a view that was made on an earlier day and is read without a net: the view's own day and the midnights
 * that this phone has seen since. Never before the view's day, never beyond what it holds.
 */
export function presentDate(view: Pick<TodayView, "today" | "madeAt" | "days">, now: Date): string {
  const passed = Math.max(0, daysBetween(phoneDate(new Date(view.madeAt)), phoneDate(now)));
  const last = view.days.at(-1)?.date ?? view.today;
  const date = dateAfter(view.today, passed);
  return date > last ? last : date;
}

/** Days that fit in the strip. */
export const STRIP = 7;

/** First place of the strip that shows day `chosen` of `count` days: it moves only when it has to. */
export const stripStart = (chosen: number, count: number): number =>
  Math.max(0, Math.min(chosen - STRIP + 1, count - STRIP));

/** "Today, Wed 2 Dec". */
export function dayTitle(date: string, today: string): string {
  const near = { "-1": "Yesterday", "0": "Today", "1": "Tomorrow" }[String(daysBetween(today, date))];
  const text = dayText(dayFromIso(date));
  return near ? `${near}, ${text}` : text;
}

/** "Wed" and "2". */
export function stripDay(date: string): { readonly weekday: string; readonly number: string } {
  const [weekday = "", number = ""] = dayText(dayFromIso(date)).split(" ");
  return { weekday, number };
}

/** HH:MM, `minutes` later; past midnight it starts again. */
export function endOf(start: string, minutes: number): string {
  const [hours = 0, rest = 0] = start.split(":").map(Number);
  const end = (hours * 60 + rest + minutes) % 1440;
  return `${String(Math.floor(end / 60)).padStart(2, "0")}:${String(end % 60).padStart(2, "0")}`;
}
