import type { StrikingBase, TrainingAge } from "../../lib/engine/types";
import { STRIKING_BASES, TRAINING_AGES } from "../../lib/engine/types";
import type { BookPin, CampBook, SportEntry } from "../../lib/schemas/camp-book";
import type { camps, holds, pins, sportEntries } from "../schema";

type CampRow = typeof camps.$inferSelect;
type SportRow = Omit<typeof sportEntries.$inferSelect, "teamId" | "campId">;
type PinRow = typeof pins.$inferSelect;
type HoldRow = Pick<typeof holds.$inferSelect, "fromDay" | "toDay"> & {
  readonly setAt: string | null;
  readonly liftedAt: string | null;
};

const oneOf = <T extends string>(values: readonly T[], text: string): T => {
  const value = values.find((candidate) => candidate === text);
  if (value === undefined) throw new Error(`Unknown value in the database: ${text}`);
  return value;
};

export const sportEntryOf = ({
  id,
  series,
  idShift,
  kind,
  title,
  start,
  minutes,
  effort,
  place,
  rrule,
  exdate,
}: SportRow): SportEntry => ({
  id,
  series,
  idShift,
  kind,
  title,
  start,
  minutes,
  effort,
  place,
  rrule,
  exdate,
});

const pinOf = ({ liftId, item, week, day, start }: PinRow): BookPin => ({
  liftId,
  item,
  week,
  date: day,
  start,
});

/** Rows to the camp book. Lists are in the order given; the engine does not depend on it. */
export function bookOf(rows: {
  camp: CampRow;
  sport: readonly SportRow[];
  pins: readonly PinRow[];
  holds: readonly HoldRow[];
  rules: Record<string, number>;
}): CampBook {
  const { camp } = rows;
  return {
    status: camp.status,
    homeZone: camp.homeZone,
    bout: {
      date: camp.boutDate,
      time: camp.boutTime,
      timeZone: camp.boutZone,
      place: camp.place,
      opponent: camp.opponent,
      ruleset: camp.ruleset,
      rounds: camp.rounds,
      roundMinutes: camp.roundMinutes,
      limitKg: camp.limitKg,
    },
    weeks: camp.weeks,
    weighIn:
      camp.weighInDate !== null && camp.weighInTime !== null
        ? { date: camp.weighInDate, time: camp.weighInTime }
        : null,
    athlete: {
      trainingAge: oneOf<TrainingAge>(TRAINING_AGES, camp.trainingAge),
      strikingBase: oneOf<StrikingBase>(STRIKING_BASES, camp.strikingBase),
      liftsPerWeek: camp.liftsPerWeek,
      freeHours: camp.freeHours,
    },
    sport: rows.sport.map(sportEntryOf),
    pins: rows.pins.map(pinOf),
    coachFactors: camp.coachFactors,
    responses: camp.responses,
    holds: rows.holds.map(({ fromDay, toDay, setAt, liftedAt }) => ({
      from: fromDay,
      to: toDay,
      ...(setAt !== null && { setAt }),
      ...(liftedAt !== null && { liftedAt }),
    })),
    rules: rows.rules,
  };
}

/** The book's own columns of a camp row. */
export const campColumnsOf = (book: CampBook) => ({
  status: book.status,
  homeZone: book.homeZone,
  boutDate: book.bout.date,
  boutTime: book.bout.time,
  boutZone: book.bout.timeZone,
  place: book.bout.place,
  opponent: book.bout.opponent,
  ruleset: book.bout.ruleset,
  rounds: book.bout.rounds,
  roundMinutes: book.bout.roundMinutes,
  limitKg: book.bout.limitKg,
  weighInDate: book.weighIn?.date ?? null,
  weighInTime: book.weighIn?.time ?? null,
  weeks: book.weeks,
  trainingAge: book.athlete.trainingAge,
  strikingBase: book.athlete.strikingBase,
  liftsPerWeek: book.athlete.liftsPerWeek,
  freeHours: book.athlete.freeHours,
  coachFactors: book.coachFactors,
  responses: book.responses,
});
