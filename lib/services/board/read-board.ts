import {
  findBoardFrame,
  listBoardCamps,
  listBoardRequests,
  listDecidedKeys,
  listStandingHolds,
  type BoardFrame,
  type BoardRequestRow,
} from "@/db/queries/board";
import { instantOf } from "@/lib/calendar/zones";
import { DAY_MINUTES, dayFromIso, daysOutOf, isoFromDay, suggestions } from "@/lib/engine";
import type { Day, Instant } from "@/lib/engine/types";
import { AppError, notFound } from "@/lib/errors";
import { can } from "@/lib/policy";
import type { BoardAttendance, BoardDay, BoardMark, BoardRow, BoardView } from "@/lib/schemas/board";
import type { TeamContext } from "@/lib/services/context";
import {
  readAnswers,
  seesOf,
  type AnsweredSession,
  type CampAnswers,
} from "@/lib/services/suggestions/answers";
import { isWork, responseInputOf } from "@/lib/services/suggestions/response-input";
import { boardDaysOf, flagsOf, holdOn, loadOf, undecided, type StandingHold } from "./flags";
import { waitingRequest } from "./waiting-request";

const FIGHT_WEEK_DAYS = 7;

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
  const made = suggestions(responseInputOf(answers, around.now));
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
      made,
      hold,
      requests: around.answersRequests ? requests : [],
      load,
      waiting: around.decides ? undecided(made, camp, decided).length : 0,
      logs,
      unit: around.unit,
    }),
    requests: around.answersRequests ? requests : [],
  };
}

/** The nearest bout of each athlete that is not over where the athlete is. They come nearest first. */
function nearestOf(all: readonly CampAnswers[]): CampAnswers[] {
  const seen = new Set<string>();
  return all.filter(({ camp: { athleteId, boutDate }, today }) => {
    if (seen.has(athleteId) || dayFromIso(boutDate) < today) return false;
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
  if (!can(member, "board.read")) throw new AppError("forbidden", "Your role may not do this.");
  const now = instantOf(ctx.now);
  const utc = Math.floor(now / DAY_MINUTES);
  const before = isoFromDay((utc - 1) as Day);
  const scope = { boutsFrom: before };
  const sees = seesOf(ctx);
  const answersRequests = can(member, "requests.answer");
  const decides = can(member, "suggestions.decide");
  const beside = Promise.all([
    listBoardCamps(db, teamId, scope),
    listStandingHolds(db, teamId, before),
    answersRequests ? listBoardRequests(db, teamId, scope, { from: before }) : [],
    decides ? listDecidedKeys(db, teamId, scope) : [],
  ]);
  const frame = await findBoardFrame(db, teamId, ctx.userId);
  if (!frame) throw notFound();
  const [answersOf, [camps, holds, requests, decided]] = await Promise.all([
    readAnswers(db, ctx, frame, scope, sees),
    beside,
  ]);
  const answers = nearestOf(camps.map(answersOf));
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
  return { rows: answers.map((one) => rowOf(one, around)), together: togetherOf(answers) };
}
