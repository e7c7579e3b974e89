import {
  listBoardCheckIns,
  listBoardSessions,
  listBoardWeights,
  type BoardCampRow,
  type BoardFrame,
  type BoardSession,
  type BoardWeight,
} from "@/db/queries/board";
import { campSpan, zoneOf } from "@/lib/book";
import { civilNow } from "@/lib/calendar/zones";
import { dayFromIso, isoFromDay, withOverrides, type CheckIn } from "@/lib/engine";
import type { Day, HouseRules } from "@/lib/engine/types";
import { can } from "@/lib/policy";
import { isMinor } from "@/lib/services/athletes/age";
import type { TeamContext } from "@/lib/services/context";
import { civilDayAt } from "@/lib/services/today/athlete-day";

/** What the reader may see of what athletes answered; what may not be seen is not read. */
export interface Sees {
  readonly logs: boolean;
  readonly pain: boolean;
  readonly checkIns: boolean;
  readonly weight: boolean;
}

/** Of staff, who see every athlete of the team or none. */
export const seesOf = ({ member }: TeamContext): Sees => ({
  logs: can(member, "logs.read"),
  pain: can(member, "pain.read"),
  checkIns: can(member, "checkins.read"),
  weight: can(member, "weight.read"),
});

/** A session with what was answered for it. */
export interface AnsweredSession {
  readonly day: Day;
  readonly id: string;
  readonly start: string;
  readonly source: "lift" | "sport" | "bout" | "weigh-in";
  readonly kind: string;
  readonly title: string;
  readonly minutes: number;
  readonly effort: number;
  readonly startsAt: number;
  readonly log: {
    readonly state: "open" | "done" | "missed";
    readonly effort: number | null;
    readonly minutes: number | null;
    readonly pain: number | null;
    readonly painPlace: string;
    readonly knock: boolean;
  } | null;
}

/** One camp with what its athlete answered lately. */
export interface CampAnswers {
  readonly camp: BoardCampRow;
  readonly span: { readonly from: Day; readonly to: Day };
  /** Where the athlete is. */
  readonly today: Day;
  readonly minor: boolean;
  readonly rules: HouseRules;
  readonly sessions: readonly AnsweredSession[];
  readonly checkIns: readonly CheckIn[];
  /** The first one that the line may start from, and those of late. */
  readonly weights: { readonly first: BoardWeight | null; readonly recent: readonly BoardWeight[] };
}

/** A weight of so many days before a camp still says where its line starts. */
const START_BACK_DAYS = 7;
/** With a day to spare over the 28 that the engine looks back for a rate. */
const WEIGHT_BACK_DAYS = 35;
/** The longest that a suggestion reaches; see `response.effort-days`. */
const AHEAD_DAYS = 14;
/** Athletes may be a civil day before or behind the gym. */
const ZONES = 1;

function sessionOf(tuple: BoardSession, sees: Sees): AnsweredSession {
  const [day, id, start, source, kind, title, minutes, effort, startsAt, state, felt, took, pain, place, knock] =
    tuple;
  return {
    day: day as Day,
    id,
    start,
    source,
    kind,
    title,
    minutes,
    effort,
    startsAt,
    log: state && {
      state,
      effort: felt,
      minutes: took,
      pain: sees.pain ? pain : null,
      painPlace: sees.pain ? (place ?? "") : "",
      knock: sees.pain && knock === true,
    },
  };
}

/** Today where the athlete is: at the gym, or at the venue after the travel. */
export function campToday(camp: BoardCampRow, now: Date): Day {
  if (camp.boutZone === camp.homeZone) return civilNow(camp.homeZone, now).day;
  const { homeZone, weeks, boutDate, boutZone, weighInDate, weighInTime, lastTravel } = camp;
  const zone = zoneOf(
    {
      homeZone,
      weeks,
      bout: { date: boutDate, timeZone: boutZone },
      weighIn: weighInDate !== null && weighInTime !== null ? { date: weighInDate, time: weighInTime } : null,
    },
    lastTravel === null ? [] : [{ kind: "travel", day: dayFromIso(lastTravel) }],
  );
  return civilDayAt(zone, now);
}

/** What was logged, checked in and weighed around now in some camps: three queries for any number of them. */
export async function loadAnswers(
  ctx: TeamContext,
  frame: BoardFrame,
  camps: readonly BoardCampRow[],
  sees: Sees,
): Promise<CampAnswers[]> {
  const { db, teamId } = ctx;
  const rules = withOverrides(frame.rules);
  const base = civilNow(frame.zone, ctx.now).day;
  const days = (back: number, ahead: number) => ({
    from: isoFromDay((base - back - ZONES) as Day),
    to: isoFromDay((base + ahead + ZONES) as Day),
  });
  const spanOf = (camp: BoardCampRow) =>
    campSpan({ bout: { date: camp.boutDate }, weeks: camp.weeks });
  const athleteIds = [...new Set(camps.map(({ athleteId }) => athleteId))];
  // The week that ended within what still counts is needed from its first day on.
  const back = rules["response.recent"] + 6;
  const [sessions, checkIns, weights] = await Promise.all([
    listBoardSessions(
      db,
      teamId,
      camps.map(({ id }) => id),
      { ...days(back, AHEAD_DAYS), logs: sees.logs || sees.pain },
    ),
    sees.checkIns ? listBoardCheckIns(db, teamId, athleteIds, days(rules["response.checkin-days"] + 1, 0)) : [],
    sees.weight
      ? listBoardWeights(
          db,
          teamId,
          camps.map((camp) => ({
            campId: camp.id,
            athleteId: camp.athleteId,
            start: isoFromDay((spanOf(camp).from - START_BACK_DAYS) as Day),
          })),
          days(WEIGHT_BACK_DAYS, 0),
        )
      : [],
  ]);
  const sessionsOf = new Map(sessions.map((row) => [row.campId, row.sessions]));
  const checkInsOf = new Map(checkIns.map((row) => [row.athleteId, row.days]));
  const weightsOf = new Map(weights.map((row) => [row.campId, row]));
  return camps.map((camp) => {
    const today = campToday(camp, ctx.now);
    const weighed = weightsOf.get(camp.id);
    return {
      camp,
      span: spanOf(camp),
      today,
      minor: isMinor(camp.dateOfBirth, isoFromDay(today)),
      rules,
      sessions: (sessionsOf.get(camp.id) ?? []).map((tuple) => sessionOf(tuple, sees)),
      checkIns: (checkInsOf.get(camp.athleteId) ?? []).map(([day, sleep, fatigue, soreness, stress]) => ({
        day: day as Day,
        sleep,
        fatigue,
        soreness,
        stress,
      })),
      weights: { first: weighed?.first ?? null, recent: weighed?.recent ?? [] },
    };
  });
}
