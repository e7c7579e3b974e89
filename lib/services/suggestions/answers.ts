import {
  listBoardCheckIns,
  listBoardPlanned,
  listBoardSessions,
  listBoardWeights,
  type BoardCampRow,
  type BoardFrame,
  type BoardScope,
  type BoardSessionsRow,
} from "@/db/queries/board";
import type { Tx } from "@/db/client";
import { campSpan, zoneOf } from "@/lib/book";
import { civilNow } from "@/lib/calendar/zones";
import { dayFromIso, isoFromDay, withOverrides, type CheckIn, type Weighing } from "@/lib/engine";
import type { Day, HouseRules, Kg } from "@/lib/engine/types";
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
  readonly weights: { readonly first: Weighing | null; readonly recent: readonly Weighing[] };
}

/** A weight of so many days before a camp still says where its line starts. */
const START_BACK_DAYS = 7;
/** With a day to spare over the 28 that the engine looks back for a rate. */
const WEIGHT_BACK_DAYS = 35;
/** Days ahead that the board shows; a suggestion may reach further. */
const AHEAD_DAYS = 10;
/** Athletes may be a civil day before or behind the gym. */
const ZONES = 1;

/** Rows of columns as a list of sessions, in the order of the day. */
function sessionsIn(row: BoardSessionsRow | undefined, sees: Sees): AnsweredSession[] {
  if (!row) return [];
  const all = row.id.map((id, n): AnsweredSession => {
    const state = row.state?.[n] ?? null;
    return {
      id,
      day: (row.day[n] ?? 0) as Day,
      start: row.start[n] ?? "",
      source: row.source[n] ?? "sport",
      kind: row.kind[n] ?? "",
      title: row.title[n] ?? "",
      minutes: row.minutes[n] ?? 0,
      effort: row.effort[n] ?? 0,
      startsAt: row.startsAt[n] ?? 0,
      log: state && {
        state,
        effort: row.felt?.[n] ?? null,
        minutes: row.took?.[n] ?? null,
        pain: sees.pain ? (row.pain?.[n] ?? null) : null,
        painPlace: sees.pain ? (row.painPlace?.[n] ?? "") : "",
        knock: sees.pain && row.knock?.[n] === true,
      },
    };
  });
  return all.sort((a, b) => a.startsAt - b.startsAt || (a.id < b.id ? -1 : 1));
}

/** Today where the athlete is: at the gym, or at the venue after the travel. */
function campToday(camp: BoardCampRow, now: Date): Day {
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

const checkInsIn = (row: Awaited<ReturnType<typeof listBoardCheckIns>>[number] | undefined): CheckIn[] =>
  (row?.day ?? []).map((day, n) => ({
    day: day as Day,
    sleep: row?.sleep[n] ?? 0,
    fatigue: row?.fatigue[n] ?? 0,
    soreness: row?.soreness[n] ?? 0,
    stress: row?.stress[n] ?? 0,
  }));

const weighing = (day: number, kg: number): Weighing => ({ day: day as Day, kg: kg as Kg });

function weightsIn(
  row: Awaited<ReturnType<typeof listBoardWeights>>[number] | undefined,
): CampAnswers["weights"] {
  const { firstDay = null, firstKg = null, day, kg } = row ?? {};
  return {
    first: firstDay !== null && firstKg !== null ? weighing(firstDay, firstKg) : null,
    recent: (day ?? []).map((one, n) => weighing(one, kg?.[n] ?? 0)),
  };
}

/** What was logged, checked in and weighed around now in the camps of a scope: three queries for any number of them. */
export async function readAnswers(
  tx: Tx,
  ctx: TeamContext,
  frame: BoardFrame,
  scope: BoardScope,
  sees: Sees,
) {
  const { teamId } = ctx;
  const rules = withOverrides(frame.rules);
  const base = civilNow(frame.zone, ctx.now).day;
  const days = (back: number, ahead: number) => ({
    from: isoFromDay((base - back - ZONES) as Day),
    to: isoFromDay((base + ahead + ZONES) as Day),
  });
  // The week that ended within what still counts is needed from its first day on.
  const reach = Math.max(AHEAD_DAYS, rules["response.effort-days"], rules["response.checkin-span"]);
  const around = days(rules["response.recent"] + 6, reach);
  const [sessions, checkIns, weights] = await Promise.all([
    sees.logs || sees.pain
      ? listBoardSessions(tx, teamId, scope, around)
      : listBoardPlanned(tx, teamId, scope, around),
    sees.checkIns ? listBoardCheckIns(tx, teamId, scope, days(rules["response.checkin-days"] + 1, 0)) : [],
    sees.weight
      ? listBoardWeights(tx, teamId, scope, { ...days(WEIGHT_BACK_DAYS, 0), startBack: START_BACK_DAYS })
      : [],
  ]);
  const sessionsOf = new Map(sessions.map((row) => [row.campId, row]));
  const checkInsOf = new Map(checkIns.map((row) => [row.athleteId, row]));
  const weightsOf = new Map(weights.map((row) => [row.campId, row]));
  return (camp: BoardCampRow): CampAnswers => {
    const today = campToday(camp, ctx.now);
    return {
      camp,
      span: campSpan({ bout: { date: camp.boutDate }, weeks: camp.weeks }),
      today,
      minor: isMinor(camp.dateOfBirth, isoFromDay(today)),
      rules,
      sessions: sessionsIn(sessionsOf.get(camp.id), sees),
      checkIns: checkInsIn(checkInsOf.get(camp.athleteId)),
      weights: weightsIn(weightsOf.get(camp.id)),
    };
  };
}
