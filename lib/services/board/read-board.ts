import {
  findBoardFrame,
  listBoardCamps,
  listBoardRequests,
  listStandingHolds,
  type BoardCampRow,
  type BoardFrame,
  type BoardRequestRow,
} from "@/db/queries/board";
import { listDecidedKeys } from "@/db/queries/suggestions";
import { instantOf } from "@/lib/calendar/zones";
import { DAY_MINUTES, dayFromIso, daysOutOf, isoFromDay } from "@/lib/engine";
import type { Day, Instant } from "@/lib/engine/types";
import { AppError, notFound } from "@/lib/errors";
import { can, isStaff } from "@/lib/policy";
import type { BoardAttendance, BoardDay, BoardMark, BoardRow, BoardView, WaitingRequest } from "@/lib/schemas/board";
import type { TeamContext } from "@/lib/services/context";
import { loadAnswers, seesOf, type AnsweredSession, type CampAnswers } from "@/lib/services/suggestions/answers";
import { isWork } from "@/lib/services/suggestions/response-input";
import { boardDaysOf, flagsOf, holdOn, loadOf, openSuggestions, type StandingHold } from "./flags";

const FIGHT_WEEK_DAYS = 7;

export const waitingRequest = (row: BoardRequestRow): WaitingRequest => ({
  id: row.id,
  campId: row.campId,
  sessionId: row.sessionId,
  source: row.source,
  title: row.title,
  date: row.day,
  start: row.start,
  reason: row.reason,
});

function grouped<T>(rows: readonly T[], keyOf: (row: T) => string): Map<string, T[]> {
  const found = new Map<string, T[]>();
  for (const row of rows) {
    const known = found.get(keyOf(row));
    if (known) known.push(row);
    else found.set(keyOf(row), [row]);
  }
  return found;
}

const markOf = ({ id, source, kind, title, start, log }: AnsweredSession, logs: boolean): BoardMark => ({
  id,
  source,
  kind,
  title,
  start,
  state: logs && (log?.state === "done" || log?.state === "missed") ? log.state : null,
});

function daysOf({ today, sessions }: CampAnswers, logs: boolean): BoardDay[] {
  const byDay = new Map<Day, BoardMark[]>(boardDaysOf(today).map((day) => [day, []]));
  for (const session of sessions) byDay.get(session.day)?.push(markOf(session, logs));
  return [...byDay].map(([day, marks]) => ({ date: isoFromDay(day), marks }));
}

function attendanceOf(
  { today, sessions }: CampAnswers,
  requests: readonly BoardRequestRow[],
): BoardAttendance[] {
  return sessions
    .filter((session) => session.day === today && isWork(session))
    .map(({ id, title, start, log }) => {
      const asked = requests.find((request) => request.sessionId === id);
      const waits = asked?.state === "asked" ? "asked" : asked?.state === "accepted" ? "excused" : "not-yet";
      const state = log?.state === "done" || log?.state === "missed" ? log.state : waits;
      return { sessionId: id, title, start, state };
    });
}

/** Sport sessions of today that two athletes or more are in, in the order of the day. */
function togetherOf(all: readonly CampAnswers[]): BoardView["together"] {
  const shared = grouped(
    all.flatMap(({ camp, today, sessions }) =>
      sessions
        .filter(({ day, source }) => day === today && source === "sport")
        .map(({ start, title }) => ({ start, title, name: camp.athleteName })),
    ),
    ({ start, title }) => `${start} ${title}`,
  );
  return [...shared.values()]
    .flatMap((rows) => {
      const [first] = rows;
      return first && rows.length > 1
        ? [{ title: first.title, start: first.start, names: rows.map(({ name }) => name) }]
        : [];
    })
    .sort((a, b) => a.start.localeCompare(b.start) || a.title.localeCompare(b.title));
}

interface Around {
  readonly now: Instant;
  readonly unit: BoardFrame["unit"];
  readonly logs: boolean;
  readonly answersRequests: boolean;
  readonly decides: boolean;
  readonly holds: ReadonlyMap<string, readonly StandingHold[]>;
  readonly requests: ReadonlyMap<string, readonly BoardRequestRow[]>;
  readonly decided: ReadonlyMap<string, readonly { readonly key: string }[]>;
}

function rowOf(answers: CampAnswers, around: Around): BoardRow {
  const { camp, today } = answers;
  const { logs } = around;
  const date = isoFromDay(today);
  const daysOut = daysOutOf(dayFromIso(camp.boutDate), today);
  const hold = holdOn(around.holds.get(camp.athleteId) ?? [], date);
  const asked = around.requests.get(camp.id) ?? [];
  const requests = asked.filter(({ state }) => state === "asked").map(waitingRequest);
  const decided = new Set((around.decided.get(camp.id) ?? []).map(({ key }) => key));
  const load = logs ? loadOf(answers) : null;
  return {
    campId: camp.id,
    athlete: { id: camp.athleteId, name: camp.athleteName },
    bout: { date: camp.boutDate, opponent: camp.opponent, place: camp.place },
    daysOut,
    phase: camp.plan.phases.find(({ from, to }) => from <= today && today <= to)?.phase ?? null,
    fightWeek: daysOut < FIGHT_WEEK_DAYS,
    onHold: hold !== null,
    today: date,
    days: daysOf(answers, logs),
    attendance: logs ? attendanceOf(answers, asked) : null,
    load,
    flags: flagsOf({
      answers,
      now: around.now,
      hold,
      requests: around.answersRequests ? requests : [],
      load,
      open: around.decides ? openSuggestions(answers, decided, around.now) : null,
      logs,
      unit: around.unit,
    }),
    requests: around.answersRequests ? requests : [],
  };
}

/** The nearest bout of each athlete. Rows come nearest first. */
function nearestOf(camps: readonly BoardCampRow[], now: Instant): BoardCampRow[] {
  const seen = new Set<string>();
  // A bout a civil day ago in UTC may still be today at the venue: what is over where the athlete is goes out below.
  return camps.filter(({ athleteId, boutDate }) => {
    if (seen.has(athleteId) || dayFromIso(boutDate) < Math.floor(now / DAY_MINUTES) - 1) return false;
    seen.add(athleteId);
    return true;
  });
}

/**
 * Every athlete with a bout to come: days out, fourteen days, attendance, flags in words. For staff; each sees what the policy
 * table lets them read, and what they may not read is not read. At most eight queries, whatever the size of the team.
 */
export async function readBoard(ctx: TeamContext): Promise<BoardView> {
  const { db, teamId, member } = ctx;
  if (!isStaff(member.role)) throw new AppError("forbidden", "Your role may not do this.");
  const now = instantOf(ctx.now);
  const utc = Math.floor(now / DAY_MINUTES);
  const before = isoFromDay((utc - 1) as Day);
  const [frame, listed] = await Promise.all([
    findBoardFrame(db, teamId, ctx.userId),
    listBoardCamps(db, teamId, { boutsFrom: before }),
  ]);
  if (!frame) throw notFound();
  const sees = seesOf(ctx);
  const answersRequests = can(member, "requests.answer");
  const decides = can(member, "suggestions.decide");
  const camps = nearestOf(listed, now);
  const ids = camps.map(({ id }) => id);
  const [answers, holds, requests, decided] = await Promise.all([
    loadAnswers(ctx, frame, camps, sees),
    listStandingHolds(db, teamId, before),
    answersRequests ? listBoardRequests(db, teamId, ids, { from: before }) : [],
    decides ? listDecidedKeys(db, teamId, ids) : [],
  ]);
  const running = answers.filter(({ camp, today }) => dayFromIso(camp.boutDate) >= today);
  const around: Around = {
    now,
    unit: frame.unit,
    logs: sees.logs,
    answersRequests,
    decides,
    holds: grouped(holds, ({ athleteId }) => athleteId),
    requests: grouped(requests, ({ campId }) => campId),
    decided: grouped(decided, ({ campId }) => campId),
  };
  return { rows: running.map((one) => rowOf(one, around)), together: togetherOf(running) };
}
