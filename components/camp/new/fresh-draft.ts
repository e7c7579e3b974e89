import { startCampForm } from "@/lib/book/start-camp";
import { isoFromDay, weekdayOf } from "@/lib/engine/geometry";
import type { Day } from "@/lib/engine/types";
import type { AthleteFacts } from "@/lib/schemas/camp-book";
import { START_DEFAULTS, readStartParams } from "@/lib/schemas/start-params";
import { draftSport, type Draft, type DraftSport, type SportRow } from "./draft";

interface Beginning {
  /** Inputs of the start page, as its address holds them. */
  readonly link: string | null;
  /** Athlete whom the camp is for, where that is known. */
  readonly athlete: { readonly id: string; readonly facts: AthleteFacts } | null;
  readonly timetable: readonly SportRow[];
  readonly zone: string;
  readonly today: Day;
}

const SATURDAY = 6;
const WEEKS = 8;

/** A Saturday that leaves room for a whole camp. */
function firstBout(today: Day): string {
  const soonest = (today + WEEKS * 7) as Day;
  return isoFromDay((soonest + ((SATURDAY - weekdayOf(soonest) + 7) % 7)) as Day);
}

const FACTS: AthleteFacts = {
  trainingAge: "intermediate",
  liftsPerWeek: 3,
  strikingBase: "whipping-round-kicks",
  freeHours: [1, 2, 3, 4, 5, 6, 7].map((weekday) => ({ weekday, from: "10:00", to: "20:00" })),
};

const byWeek = (a: DraftSport, b: DraftSport): number =>
  Math.min(...a.weekdays) - Math.min(...b.weekdays) || a.time.localeCompare(b.time);

function draftOfLink(link: string, { zone, today, athlete }: Beginning): Draft | null {
  const params = readStartParams(new URLSearchParams(link), { ...START_DEFAULTS, date: firstBout(today) });
  const form = startCampForm(params, params.zone ?? zone, "");
  if (!form) return null;
  return {
    athleteId: athlete?.id ?? "",
    athleteName: "",
    homeZone: form.homeZone,
    bout: form.bout,
    weeks: form.weeks,
    weighIn: form.weighIn,
    facts: athlete?.facts ?? form.facts,
    sport: form.sport.map((row) => draftSport(row, form.bout.date)),
  };
}

/** What the form of a new camp begins with: the start page's camp, or the team's week and a bout to be dated. */
export function freshDraft(beginning: Beginning): Draft {
  const { link, athlete, timetable, zone, today } = beginning;
  const kept = link === null ? null : draftOfLink(link, beginning);
  if (kept) return kept;
  return {
    athleteId: athlete?.id ?? "",
    athleteName: "",
    homeZone: zone,
    bout: {
      date: firstBout(today),
      time: "20:00",
      timeZone: zone,
      place: "",
      opponent: "",
      ruleset: "",
      rounds: null,
      roundMinutes: null,
      limitKg: null,
    },
    weeks: WEEKS,
    weighIn: null,
    facts: athlete?.facts ?? FACTS,
    sport: timetable.map((row) => draftSport(row, null)).sort(byWeek),
  };
}
