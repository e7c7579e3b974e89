import { readWeekly, weeklyRule } from "../details/recurrence";
import { campSpan } from "@/lib/book/camp-span";
import { dayFromIso, isoFromDay, weekdayOf } from "@/lib/engine/geometry";
import type { Day, SportKind } from "@/lib/engine/types";
import type { CampForm } from "@/lib/schemas/camp";
import type { AthleteFacts, Bout, CampBook, SportEntry } from "@/lib/schemas/camp-book";

export type SportRow = Omit<SportEntry, "id" | "series" | "idShift">;

/** One line of the camp's week, as the form has it. */
export interface DraftSport {
  /** Comes into the camp. */
  on: boolean;
  kind: SportKind;
  title: string;
  weekdays: number[];
  time: string;
  minutes: number;
  effort: number;
  place: string;
  /** Days out of the last one. */
  lastDaysOut: number;
  /** A rule that says more than weekdays: kept as it is. */
  own: SportRow | null;
}

/** The form of a new camp. */
export interface Draft {
  /** Id of an athlete of the team; empty for a new one. */
  athleteId: string;
  athleteName: string;
  homeZone: string;
  bout: Bout;
  weeks: number;
  weighIn: CampBook["weighIn"];
  facts: AthleteFacts;
  sport: DraftSport[];
}

/** Days out at which a kind of session leaves the camp, unless the coach says otherwise: common practice, no published source. */
export const LAST_DAYS_OUT: Record<SportKind, number> = {
  "hard-sparring": 10,
  "technical-sparring": 7,
  skill: 3,
  conditioning: 7,
  travel: 0,
  rest: 0,
  other: 3,
};

/** A line of the team's week, or of the start page's camp, as the form has it. */
export function draftSport(row: SportRow, boutDate: string | null): DraftSport {
  const date = row.start.slice(0, 10);
  const weekly = row.rrule === null ? null : readWeekly(row.rrule, date, boutDate ?? date);
  const last =
    weekly?.until && boutDate ? dayFromIso(boutDate) - dayFromIso(weekly.until) : LAST_DAYS_OUT[row.kind];
  return {
    on: true,
    kind: row.kind,
    title: row.title,
    weekdays: weekly ? [...weekly.weekdays] : [weekdayOf(dayFromIso(date))],
    time: row.start.slice(11),
    minutes: row.minutes,
    effort: row.effort,
    place: row.place,
    lastDaysOut: Math.max(0, last),
    own: weekly ? null : row,
  };
}

function sportRow(draft: DraftSport, bout: Bout, weeks: number): SportRow[] {
  if (!draft.on) return [];
  const { kind, title, minutes, effort, place } = draft;
  if (draft.own) return [{ ...draft.own, kind, title, minutes, effort, place }];
  const span = campSpan({ bout, weeks });
  const last = (span.to - Math.max(1, draft.lastDaysOut)) as Day;
  const first = Array.from({ length: 7 }, (_, index) => (span.from + index) as Day).find((day) =>
    draft.weekdays.includes(weekdayOf(day)),
  );
  if (first === undefined || first > last) return [];
  const start = isoFromDay(first);
  return [
    {
      kind,
      title,
      start: `${start}T${draft.time}`,
      minutes,
      effort,
      place,
      rrule: weeklyRule({ weekdays: draft.weekdays, until: isoFromDay(last) }, start, bout.date),
      exdate: [],
    },
  ];
}

/** What is sent; not yet checked, since a draft may hold a date that is being typed. */
export function formOfDraft(draft: Draft): CampForm {
  const { athleteId, athleteName, sport, ...rest } = draft;
  return {
    ...rest,
    athlete: athleteId ? { id: athleteId } : { name: athleteName },
    sport: sport.flatMap((row) => sportRow(row, draft.bout, draft.weeks)),
  };
}

/** The book that a form makes, for laying the camp out beside it. Ids are made by the server when it is kept. */
export const bookOfForm = (form: CampForm, rules: CampBook["rules"]): CampBook => ({
  status: "on",
  homeZone: form.homeZone,
  bout: form.bout,
  weeks: form.weeks,
  weighIn: form.weighIn,
  athlete: form.facts,
  sport: form.sport.map((row, index) => ({ ...row, id: `row-${index}`, series: `row-${index}`, idShift: 0 })),
  pins: [],
  coachFactors: {},
  responses: [],
  holds: [],
  rules,
});
