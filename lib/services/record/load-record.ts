import type { DayLoadRow } from "@/db/queries/athlete-record";
import { dayFromIso, isoFromDay, weekLoad } from "@/lib/engine";
import type { Day } from "@/lib/engine/types";
import type { LoadDay, LoadRecord, LoadWeek } from "@/lib/schemas/athlete-record";

/** Eight times seven days, today the last of them. */
export const LOAD_DAYS = 56;

/** One entry a day from `from` to `to`; days without a session are 0. */
export function loadDaysOf(rows: readonly DayLoadRow[], from: Day, to: Day): LoadDay[] {
  const found = new Map(rows.map((row) => [`${row.day} ${row.source}`, row]));
  return Array.from({ length: Math.max(0, to - from + 1) }, (_, index): LoadDay => {
    const date = isoFromDay((from + index) as Day);
    const [sport, lifting] = [found.get(`${date} sport`), found.get(`${date} lift`)];
    return {
      date,
      plannedSport: sport?.planned ?? 0,
      plannedLifting: lifting?.planned ?? 0,
      doneSport: sport?.done ?? 0,
      doneLifting: lifting?.done ?? 0,
    };
  });
}

const doneOf = (day: LoadDay): number => day.doneSport + day.doneLifting;

/** Total, monotony and strain of seven days; of what was done alone, and only where something was logged. */
function weekOf(days: readonly LoadDay[], answered: boolean): LoadWeek {
  const week = weekLoad(days.map(doneOf));
  return {
    from: days[0]?.date ?? "",
    to: days.at(-1)?.date ?? "",
    planned: days.reduce((sum, day) => sum + day.plannedSport + day.plannedLifting, 0),
    done: answered ? week.total : null,
    monotony: answered ? week.monotony : null,
    strain: answered ? week.strain : null,
  };
}

/** Loads of the last eight times seven days. */
export function loadRecordOf(rows: readonly DayLoadRow[], today: Day): LoadRecord {
  const from = (today - LOAD_DAYS + 1) as Day;
  const days = loadDaysOf(rows, from, today);
  const weeks = Array.from({ length: LOAD_DAYS / 7 }, (_, week) => {
    const [first, last] = [from + 7 * week, from + 7 * week + 6];
    const answered = rows.some((row) => {
      const day = dayFromIso(row.day);
      return row.answered > 0 && day >= first && day <= last;
    });
    return weekOf(days.slice(7 * week, 7 * week + 7), answered);
  });
  return { days, weeks };
}
