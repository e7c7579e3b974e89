import { loweredFor } from "./lowered";
import {
  COMMON_PRACTICE,
  type LoggedSession,
  type ResponseInput,
  type SuggestedChange,
  type Suggestion,
} from "./types";

const inOrder = (a: LoggedSession, b: LoggedSession): number =>
  a.day - b.day || a.start - b.start || (a.id < b.id ? -1 : a.id > b.id ? 1 : 0);

/** Logs that still count, oldest first. */
function recentLogs({ logs, today, rules }: ResponseInput): readonly LoggedSession[] {
  return logs.filter(({ day }) => day <= today && day > today - rules["response.recent"]).sort(inOrder);
}

const above = ({ effort, expectedEffort, missed }: LoggedSession): number | null =>
  missed || effort === null || expectedEffort === null ? null : effort - expectedEffort;

/**
 * The last two sessions both felt harder than planned: lifting and sport each by itself, since a light skill session between
 * two heavy lifts says nothing of the lifts.
 */
export function effortSuggestions(input: ResponseInput): readonly Suggestion[] {
  const { rules } = input;
  const recent = recentLogs(input);
  return (["lift", "sport"] as const).flatMap((of): Suggestion[] => {
    const rated = recent.flatMap((log) => {
      const points = log.of === of ? above(log) : null;
      return points === null ? [] : [{ log, points }];
    });
    const [first, last] = rated.slice(-2);
    const least = rules["response.effort-above"];
    if (!first || !last || first.points < least || last.points < least) return [];
    return [
      {
        key: `effort:${last.log.id}`,
        kind: "effort",
        title: `${of === "lift" ? "Lifting" : "Sport"} felt harder than planned, twice running`,
        numbers: [
          { label: `${first.log.title}, above expected by`, value: first.points, unit: "points" },
          { label: `${last.log.title}, above expected by`, value: last.points, unit: "points" },
        ],
        text: `Effort was ${least} or more above what was expected in two sessions running. Fewer sets for a while are on offer.`,
        source: `Effort on the CR-10 scale: Foster et al. 2001, J Strength Cond Res 15(1):109-115; the threshold is ${COMMON_PRACTICE}`,
        change: loweredFor(input, rules["response.effort-days"], rules["response.effort-factor"]),
      },
    ];
  });
}

/** Pain above the threshold: the newest report, with the worst and the number beside it. A talk, never a change. */
export function painSuggestions(input: ResponseInput): readonly Suggestion[] {
  const threshold = input.rules["response.pain"];
  const painful = recentLogs(input).flatMap((log) =>
    log.pain !== null && log.pain > threshold ? [{ log, pain: log.pain }] : [],
  );
  const last = painful.at(-1);
  if (!last) return [];
  return [
    {
      key: `pain:${last.log.id}`,
      kind: "pain",
      title: `Pain above ${threshold}`,
      numbers: [
        { label: `${last.log.title}, pain`, value: last.pain, unit: "of 10" },
        { label: "Worst of late", value: Math.max(...painful.map(({ pain }) => pain)), unit: "of 10" },
        { label: "Reported in", value: painful.length, unit: "sessions" },
      ],
      text: "Ask the athlete, and the medic where there is one, before the next session. No plan decides about pain.",
      source: COMMON_PRACTICE,
      change: null,
    },
  ];
}

/** A step down for the first lift that is still to come; null where there is none or it is as low already. */
function stepDown({ liftsAhead, today, rules }: ResponseInput): SuggestedChange | null {
  const [next] = liftsAhead
    .filter(({ day }) => day >= today)
    .sort((a, b) => a.day - b.day || (a.id < b.id ? -1 : a.id > b.id ? 1 : 0));
  if (!next) return null;
  const factor = Math.max(0.5, Math.round(next.coachFactor * rules["response.missed-factor"] * 100) / 100);
  return factor < next.coachFactor ? { kind: "factor", liftId: next.id, factor } : null;
}

/** A lift was missed. Once is a question; twice running, the next one may start a step lower. */
export function missedSuggestions(input: ResponseInput): readonly Suggestion[] {
  const lifts = recentLogs(input).filter((log) => log.of === "lift");
  const missed = lifts.filter((log) => log.missed);
  const last = missed.at(-1);
  if (!last) return [];
  const run = lifts.length - 1 - lifts.findLastIndex((log) => !log.missed);
  return [
    {
      key: `missed:${last.id}`,
      kind: "missed",
      title: run > 1 ? `${run} lifts missed running` : `${last.title} missed`,
      numbers: [
        { label: "Missed", value: missed.length, unit: "sessions" },
        { label: "Of the last", value: input.rules["response.recent"], unit: "days" },
      ],
      text:
        run > 1
          ? "Ask why. What was missed is not added on top; the next lift may start a step lower."
          : "Ask why. What was missed is not added on top of the next lift.",
      source: COMMON_PRACTICE,
      change: run > 1 ? stepDown(input) : null,
    },
  ];
}
