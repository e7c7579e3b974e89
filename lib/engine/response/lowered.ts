import type { Day } from "../types";
import type { ResponseInput, SuggestedChange } from "./types";

/** Fewer sets from today on for so many days, inside the camp; null where no lift lies in them or nothing would change. */
export function loweredFor(
  { today, camp, liftsAhead }: ResponseInput,
  days: number,
  factor: number,
): SuggestedChange | null {
  const from = Math.max(today, camp.from) as Day;
  const to = Math.min(today + days - 1, camp.to) as Day;
  const some = liftsAhead.some(({ day }) => day >= from && day <= to);
  return some && factor < 1 ? { kind: "response", from, to, factor } : null;
}
