import { campSpan } from "@/lib/book/camp-span";
import type { Day } from "@/lib/engine/types";
import { todayOf } from "../today";
import type { Desk } from "../use-desk";

/** First and last day that a session of this camp may be moved to. */
export function moveSpan({ shown, now }: Desk): { from: Day; to: Day } {
  const { from, to } = campSpan(shown.book);
  return { from: Math.max(from, todayOf(shown.book, now)) as Day, to };
}
