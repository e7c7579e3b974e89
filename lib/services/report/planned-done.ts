import type { AnsweredRow } from "@/db/queries/report";
import { dayFromIso, isoFromDay } from "@/lib/engine";
import type { Plan, SportKind } from "@/lib/engine/types";
import type { Attendance, ReportWeek } from "@/lib/schemas/report";

const TITLES: Readonly<Record<SportKind | "lift", string>> = {
  lift: "Lifting",
  "hard-sparring": "Hard sparring",
  "technical-sparring": "Technical sparring",
  skill: "Skill",
  conditioning: "Conditioning",
  travel: "Travel",
  rest: "Rest",
  other: "Other",
};

const isPast = (row: AnsweredRow, now: Date): boolean => row.startsAt <= now;

/** Rest and travel are no work to be done. */
const isWork = ({ kind }: AnsweredRow): boolean => kind !== "rest" && kind !== "travel";

/** Planned against answered, lifting as one line and sport by its kind, in the order in which they first stand in the camp. */
export function attendanceOf(rows: readonly AnsweredRow[], now: Date): Attendance[] {
  const lines = new Map<string, { title: string; rows: AnsweredRow[] }>();
  for (const row of rows.filter(isWork)) {
    const key = row.source === "lift" ? "lift" : (row.kind as SportKind);
    const line = lines.get(key) ?? { title: TITLES[key], rows: [] };
    line.rows.push(row);
    lines.set(key, line);
  }
  return [...lines].map(([key, line]) => {
    const count = (of: (row: AnsweredRow) => boolean): number => line.rows.filter(of).length;
    return {
      key,
      title: line.title,
      planned: line.rows.length,
      done: count(({ state }) => state === "done"),
      missed: count(({ state }) => state === "missed"),
      unanswered: count((row) => isPast(row, now) && row.state !== "done" && row.state !== "missed"),
    };
  });
}

const sum = (values: readonly number[]): number => values.reduce((total, value) => total + value, 0);

/** Camp weeks in order: sets of lifting and load of everything, planned and done. */
export function weeksOf(rows: readonly AnsweredRow[], plan: Pick<Plan, "weeks">): ReportWeek[] {
  return plan.weeks.map(({ weeksOut, from, to, phase }) => {
    const own = rows.filter(({ day }) => dayFromIso(day) >= from && dayFromIso(day) <= to);
    const done = own.filter(({ state }) => state === "done");
    const lifted = done.filter(({ source }) => source === "lift");
    return {
      weeksOut,
      from: isoFromDay(from),
      phase,
      setsPlanned: sum(own.map(({ lift }) => lift?.sets ?? 0)),
      setsDone: lifted.length === 0 ? null : sum(lifted.map(({ doneSets }) => doneSets ?? 0)),
      loadPlanned: sum(own.map(({ effort, minutes }) => effort * minutes)),
      loadDone:
        done.length === 0
          ? null
          : sum(done.map(({ doneEffort, doneMinutes }) => (doneEffort ?? 0) * (doneMinutes ?? 0))),
    };
  });
}

/** Hard rounds that were logged; null where none was asked for. */
export function hardRoundsOf(rows: readonly AnsweredRow[]): number | null {
  const counted = rows.flatMap(({ hardRounds }) => (hardRounds === null ? [] : [hardRounds]));
  return counted.length === 0 ? null : sum(counted);
}
