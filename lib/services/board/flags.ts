import { dayFromIso, minuteFromHhmm, type Suggestion } from "@/lib/engine";
import type { Day } from "@/lib/engine/types";
import { dayText, momentText } from "@/lib/format/civil";
import { massNumber, type MassUnit } from "@/lib/format/load";
import type { BoardFlag, BoardRow, WaitingRequest } from "@/lib/schemas/board";
import type { AnsweredSession, CampAnswers } from "@/lib/services/suggestions/answers";
import { doneLoad, isWork, plannedLoad } from "@/lib/services/suggestions/response-input";

/** Load is flagged when it is off what was due by so much of it; common practice, no published source. */
const LOAD_OFF = 0.25;

const times = (count: number, one: string, many: string): string =>
  count === 1 ? `1 ${one}` : `${count} ${many}`;
const whole = new Intl.NumberFormat("en-GB", { maximumFractionDigits: 0 });
const au = (load: number): string => whole.format(load);

const recentOf = ({ sessions, today, rules }: CampAnswers): AnsweredSession[] =>
  sessions.filter(({ day }) => day <= today && day > today - rules["response.recent"]);

export interface StandingHold {
  readonly from: string;
  readonly to: string | null;
}

function holdFlag(hold: StandingHold | null): BoardFlag[] {
  if (!hold) return [];
  const until = hold.to === null ? "until the medic lifts it" : `to ${dayText(dayFromIso(hold.to))}`;
  return [{ kind: "hold", text: `On a hold since ${dayText(dayFromIso(hold.from))}, ${until}` }];
}

function painFlags(answers: CampAnswers): BoardFlag[] {
  const recent = recentOf(answers);
  const knock = recent.findLast(({ log }) => log?.knock);
  const painful = recent.findLast(({ log }) => log !== null && log.pain !== null && log.pain > 0);
  const place = painful?.log?.painPlace ? `, ${painful.log.painPlace}` : "";
  return [
    ...(knock
      ? [{ kind: "knock" as const, text: `Knock to the head in ${knock.title}, ${dayText(knock.day)}` }]
      : []),
    ...(painful?.log
      ? [{ kind: "pain" as const, text: `Pain ${painful.log.pain} of 10${place}, ${dayText(painful.day)}` }]
      : []),
  ];
}

function missedFlag(answers: CampAnswers): BoardFlag[] {
  const missed = recentOf(answers).filter(({ log }) => log?.state === "missed").length;
  const days = answers.rules["response.recent"];
  return missed === 0
    ? []
    : [{ kind: "missed", text: `${times(missed, "session", "sessions")} missed in ${days} days` }];
}

const valueOf = ({ numbers }: Suggestion, label: string): number | null =>
  numbers.find((number) => number.label === label)?.value ?? null;
const ofKind = (made: readonly Suggestion[], kind: Suggestion["kind"]): readonly Suggestion[] =>
  made.filter((suggestion) => suggestion.kind === kind);

/** The newest check-in, of today or yesterday, beyond the athlete's own normal. */
const checkInFlag = (made: readonly Suggestion[]): BoardFlag[] =>
  ofKind(made, "check-in").map(({ numbers }) => {
    const [sum = 0, mean = 0, sd = 0, days = 0] = numbers.map(({ value }) => value);
    const own = `${mean.toFixed(1)} ± ${sd.toFixed(1)} (SD of ${days} days)`;
    return { kind: "check-in", text: `Check-in ${sum} of 28, own normal ${own}` };
  });

/** "64.2 kg, 1.3 kg above the line". */
function weightWords(made: Suggestion, unit: MassUnit): string {
  const mass = (kg: number): string => `${massNumber(kg, unit)} ${unit}`;
  const kg = mass(valueOf(made, "Weight") ?? 0);
  const [above, ceiling] = [valueOf(made, "Above the line by"), valueOf(made, "Ceiling")];
  if (above !== null) return `${kg}, ${mass(above)} above the line`;
  if (ceiling !== null)
    return `${kg}, above ${mass(ceiling)}, the ceiling at ${valueOf(made, "Before the weigh-in") ?? 0} h before the weigh-in`;
  const rate = (valueOf(made, "Rate a week") ?? 0).toFixed(1);
  return `Weight down ${rate} % a week over ${valueOf(made, "Over") ?? 0} days`;
}

const weightFlags = (made: readonly Suggestion[], unit: MassUnit): BoardFlag[] =>
  ofKind(made, "weight").map((one) => ({ kind: "weight", text: weightWords(one, unit) }));

/** The camp week that is under way. Null before the camp begins. */
export function loadOf({ camp, sessions, today }: CampAnswers): BoardRow["load"] {
  const week = camp.plan.caps.find(([from, to]) => from <= today && today <= to);
  if (!week) return null;
  const [from, to] = week;
  const work = sessions.filter((session) => isWork(session) && session.day >= from && session.day <= to);
  const sum = (list: readonly number[]): number => list.reduce((total, load) => total + load, 0);
  const answered = ({ log }: AnsweredSession): boolean => log?.state === "done" || log?.state === "missed";
  return {
    done: sum(work.map(doneLoad)),
    due: sum(work.filter((one) => one.day < today || (one.day === today && answered(one))).map(plannedLoad)),
    planned: sum(work.map(plannedLoad)),
  };
}

function loadFlags(load: BoardRow["load"], made: readonly Suggestion[]): BoardFlag[] {
  const beyond = ofKind(made, "week-load").map(({ title, numbers }): BoardFlag => {
    const [total, cap] = numbers;
    return { kind: "load", text: `${title}: ${au(total?.value ?? 0)} of ${au(cap?.value ?? 0)} AU` };
  });
  if (!load || load.due === 0 || Math.abs(load.done / load.due - 1) < LOAD_OFF) return beyond;
  const off = Math.round((load.done / load.due - 1) * 100);
  const words = `${au(load.done)} AU done this week, ${au(load.due)} AU due, ${off < 0 ? "" : "+"}${off} %`;
  return [...beyond, { kind: "load", text: words }];
}

function planFlags({ camp }: CampAnswers): BoardFlag[] {
  // What had no room because it is past is no news.
  const unplaced = camp.plan.unplaced.filter((rule) => rule !== "past").length;
  const broken = camp.plan.violations.length;
  return [
    ...(unplaced > 0
      ? [{ kind: "unplaced" as const, text: `${times(unplaced, "lift has", "lifts have")} no place` }]
      : []),
    ...(broken > 0
      ? [{ kind: "rules" as const, text: `${times(broken, "rule is", "rules are")} broken` }]
      : []),
  ];
}

const requestFlags = (requests: readonly WaitingRequest[]): BoardFlag[] =>
  requests.map(({ title, date, start }) => ({
    kind: "request",
    text: `Asks to be let off ${title}, ${momentText({ day: dayFromIso(date), start: minuteFromHhmm(start) })}`,
  }));

/** What of the engine's suggestions nobody has decided on. */
export function undecided(
  made: readonly Suggestion[],
  { responses }: Pick<CampAnswers["camp"], "responses">,
  decided: ReadonlySet<string>,
): readonly Suggestion[] {
  // A response in force under the same key was accepted, also where it was saved without a decision.
  const inForce = new Set(responses.map(({ id }) => id));
  return made.filter(({ key }) => !decided.has(key) && !inForce.has(key));
}

interface FlagFacts {
  readonly answers: CampAnswers;
  /** What the engine makes of the answers that the reader may see, decided on or not. */
  readonly made: readonly Suggestion[];
  readonly hold: StandingHold | null;
  readonly requests: readonly WaitingRequest[];
  readonly load: BoardRow["load"];
  /** How many of them wait for a decision; 0 for those who may not decide. */
  readonly waiting: number;
  /** Whether the reader may read logs; pain, check-ins and weights are not in the answers where they may not be read. */
  readonly logs: boolean;
  readonly unit: MassUnit;
}

/** Flags of one row in the order of `FLAG_KINDS`. */
export function flagsOf({
  answers,
  made,
  hold,
  requests,
  load,
  waiting,
  logs,
  unit,
}: FlagFacts): BoardFlag[] {
  return [
    ...holdFlag(hold),
    ...painFlags(answers),
    ...requestFlags(requests),
    ...weightFlags(made, unit),
    ...checkInFlag(made),
    ...(logs ? missedFlag(answers) : []),
    ...(logs ? loadFlags(load, made) : []),
    ...planFlags(answers),
    ...(waiting > 0
      ? [{ kind: "suggestions" as const, text: times(waiting, "suggestion", "suggestions") }]
      : []),
  ];
}

/** The hold that stands on a day; of several, the one that began first. */
export const holdOn = (holds: readonly StandingHold[], date: string): StandingHold | null =>
  holds.find(({ from, to }) => from <= date && (to === null || to >= date)) ?? null;

/** Three days back, today, ten days ahead. */
const BOARD_SPAN = { back: 3, ahead: 10 } as const;

export const boardDaysOf = (today: Day): Day[] =>
  Array.from(
    { length: BOARD_SPAN.back + 1 + BOARD_SPAN.ahead },
    (_, index) => (today - BOARD_SPAN.back + index) as Day,
  );
