import { withOverrides, type Item, type PlanInput, type SportKind, type SportSession } from "@/lib/engine";
import { itemSpec } from "@/lib/engine/menu";
import type { FixedLift, PlacementRequest, Slot } from "@/lib/engine/placement";
import { day, freeHours, minute, planInput } from "./plan-input";

/** A camp to Saturday 9 January 2027 with nothing in it: free at all hours, starts every 5 minutes, only must rules. */
export const emptyCamp = (
  over: Partial<PlanInput> = {},
  rules: Readonly<Record<string, number>> = {},
): PlanInput =>
  planInput({
    sport: [],
    weighIn: null,
    athlete: { ...planInput().athlete, freeHours: freeHours("00:00", "24:00") },
    rules: withOverrides({ "start-step.minutes": 5, ...NO_PRICES, ...rules }),
    ...over,
  });

/** Should rules that cost nothing, so that a test can ask for one of them alone. */
const NO_PRICES = {
  "rest-day.price": 0,
  "sport-gap.price": 0,
  "heavy-before-hard-48.price": 0,
  "full-dose.price": 0,
  "fresh-first.price": 0,
  "spread.next-day": 0,
  "spread.second-day": 0,
  "stay-put.near": 0,
  "stay-put.far": 0,
};

/** One session, "2026-12-01 19:00". */
export function session(kind: SportKind, at: string, over: Partial<SportSession> = {}): SportSession {
  const [date = "", time = ""] = at.split(" ");
  return {
    id: `${kind} ${at}`,
    kind,
    title: kind,
    day: day(date),
    start: minute(time),
    minutes: 60,
    effort: 5,
    ...over,
  };
}

const weekOf = (input: PlanInput, date: string): number => Math.floor((input.bout.day - day(date)) / 7);

export interface LiftAt {
  readonly item?: Item;
  readonly at: string;
  readonly minutes?: number;
}

/** A lift that a coach pinned. */
export function pinnedLift(input: PlanInput, { item = "strength-b", at, minutes = 60 }: LiftAt): FixedLift {
  const [date = "", time = ""] = at.split(" ");
  const { heavyLower, primer } = itemSpec(item);
  const week = weekOf(input, date);
  return {
    ...{ id: `${item}.${week}`, item, week, day: day(date), start: minute(time), minutes },
    ...{ heavyLower, primer, pinned: true, past: false },
  };
}

/** A lift that wants a place in a week, given by one of the week's days. */
export function slotIn(
  input: PlanInput,
  date: string,
  item: Item = "strength-b",
  over: Partial<Slot> = {},
): Slot {
  const { heavyLower, explosive, fresh, primer } = itemSpec(item);
  const week = weekOf(input, date);
  return {
    ...{ id: `${item}.${week}`, item, week, minutes: 60, heavyLower, explosive, fresh, primer },
    ...{ order: 0, base: null, ...over },
  };
}

export const published = (at: string): NonNullable<Slot["base"]> => {
  const [date = "", time = ""] = at.split(" ");
  return { day: day(date), start: minute(time) };
};

export const request = (input: PlanInput, over: Partial<PlacementRequest> = {}): PlacementRequest => ({
  input,
  slots: [],
  fixed: [],
  ...over,
});
