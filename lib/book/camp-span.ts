import { dayFromIso, weekSpan } from "@/lib/engine/geometry";
import type { Day } from "@/lib/engine/types";

/** First and last day of the camp: whole weeks that end with the bout. */
export function campSpan(book: { readonly bout: { readonly date: string }; readonly weeks: number }): {
  from: Day;
  to: Day;
} {
  const boutDay = dayFromIso(book.bout.date);
  return { from: weekSpan(boutDay, book.weeks - 1).from, to: boutDay };
}
