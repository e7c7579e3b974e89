import {
  dayFromIso,
  descentLine,
  minuteFromHhmm,
  type LoggedSession,
  type ResponseInput,
  type WeekAnswer,
} from "@/lib/engine";
import type { Au, Day, Instant, Kg } from "@/lib/engine/types";
import type { AnsweredSession, CampAnswers } from "./answers";

/** Done load of a session, AU: effort x minutes as answered (Foster 1998); 0 where it was not done. */
export const doneLoad = ({ log }: AnsweredSession): number =>
  log?.state === "done" ? (log.effort ?? 0) * (log.minutes ?? 0) : 0;

export const plannedLoad = ({ effort, minutes }: AnsweredSession): number => effort * minutes;

export const isWork = ({ source }: AnsweredSession): boolean => source === "lift" || source === "sport";

/** Still to come: not begun, and not answered as done or missed. */
export const isAhead = ({ startsAt, log }: AnsweredSession, now: Instant): boolean =>
  startsAt > now && (log === null || log.state === "open");

function weeksOf({ camp, sessions }: CampAnswers, now: Instant): WeekAnswer[] {
  return camp.plan.caps.map(([from, to, cap]) => {
    const work = sessions.filter((session) => isWork(session) && session.day >= from && session.day <= to);
    const sum = (list: readonly number[]): Au => list.reduce((total, load) => total + load, 0) as Au;
    return {
      from: from as Day,
      to: to as Day,
      cap: cap as Au | null,
      done: sum(work.map(doneLoad)),
      ahead: sum(work.filter((session) => isAhead(session, now)).map(plannedLoad)),
    };
  });
}

const logsOf = (sessions: readonly AnsweredSession[]): LoggedSession[] =>
  sessions.flatMap(({ id, source, title, day, start, effort, log }): LoggedSession[] =>
    log && (source === "lift" || source === "sport")
      ? [
          {
            id,
            of: source,
            title,
            day,
            start: minuteFromHhmm(start),
            expectedEffort: effort,
            effort: log.effort,
            missed: log.state === "missed",
            pain: log.pain,
          },
        ]
      : [],
  );

/** The way down in weight: the line starts at the first weight from a week before the camp on. Null where none is followed. */
function weightFactsOf({ camp, weights, minor, rules }: CampAnswers): ResponseInput["weight"] {
  const { limitKg, weighInDate } = camp;
  if (limitKg === null || weighInDate === null) return null;
  const weighIn = dayFromIso(weighInDate);
  const limit = limitKg as Kg;
  const start = weights.first && weights.first.day < weighIn ? weights.first : null;
  return {
    minor,
    limitKg: limit,
    weighIn,
    line: start ? descentLine(start, limit, weighIn, rules) : null,
    weights: weights.recent,
  };
}

/** What the engine makes suggestions from. */
export function responseInputOf(answers: CampAnswers, now: Instant): ResponseInput {
  const { camp, span, today, rules, sessions, checkIns } = answers;
  return {
    today,
    camp: span,
    checkIns,
    logs: logsOf(sessions),
    weight: weightFactsOf(answers),
    weeks: weeksOf(answers, now),
    liftsAhead: sessions
      .filter((session) => session.source === "lift" && isAhead(session, now))
      .map((session) => ({
        id: session.id,
        title: session.title,
        day: session.day,
        load: plannedLoad(session) as Au,
        coachFactor: camp.coachFactors[session.id] ?? 1,
      })),
    rules,
  };
}
