import { dayFromIso, isoFromDay } from "@/lib/engine";
import type { Day } from "@/lib/engine/types";
import type { ReportView } from "@/lib/schemas/report";

/**
 * Days of a stand-down that was ordered: the count starts on the first day after the event (Ohio Admin. Code 3773-7-19), both ends
 * are inside, and the day after the last is the first on which contact may be asked for again. `days` 1 or more.
 */
export function standDownOf(boutDate: string, days: number): NonNullable<ReportView["standDown"]> {
  const bout = dayFromIso(boutDate);
  return {
    days,
    from: isoFromDay((bout + 1) as Day),
    to: isoFromDay((bout + days) as Day),
    eligible: isoFromDay((bout + days + 1) as Day),
  };
}
