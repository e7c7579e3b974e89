import type { CheckInRow } from "@/db/queries/check-ins";
import { isoFromDay, sampleSd } from "@/lib/engine";
import type { Day } from "@/lib/engine/types";
import type { CheckInPart, CheckInRecord } from "@/lib/schemas/athlete-record";

/** Days that are shown, today the last of them. */
export const CHECK_IN_DAYS = 28;

/** Check-ins of the last 28 days with the athlete's own mean and spread of each answer. */
export function checkInRecordOf(rows: readonly CheckInRow[], today: Day): CheckInRecord {
  const ownOf = (part: CheckInPart) => {
    const values = rows.map((row) => row[part]);
    if (values.length === 0) return null;
    return { mean: values.reduce((sum, value) => sum + value, 0) / values.length, sd: sampleSd(values) };
  };
  return {
    from: isoFromDay((today - CHECK_IN_DAYS + 1) as Day),
    to: isoFromDay(today),
    days: rows.map(({ day, sleep, fatigue, soreness, stress }) => ({
      date: day,
      sleep,
      fatigue,
      soreness,
      stress,
    })),
    own: {
      sleep: ownOf("sleep"),
      fatigue: ownOf("fatigue"),
      soreness: ownOf("soreness"),
      stress: ownOf("stress"),
    },
  };
}
