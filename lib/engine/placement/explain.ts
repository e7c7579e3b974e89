import { ITEM_TITLES } from "../menu/items";
import { hoursText } from "../rules/wording";
import type { Candidate, Day, Instant, Minute, PlacementProblem, Reason } from "../types";
import type { Slot } from "./request";
import { SlotDay } from "./slot-day";
import { liftingOf, type Lifting, type Surroundings } from "./surroundings";

/** Sparring further off than this says nothing of a place, minutes: every rule on it ends before. */
const FAR = 96 * 60;

/** How far hard sparring is on either side, with what the rules ask. */
function sparringReasons({ input, hard }: Surroundings, lift: Lifting, startsAt: Instant): Reason[] {
  const { rules } = input;
  const reasons: Reason[] = [];
  const next = hard.nextFrom(startsAt + lift.minutes);
  const before = next ? next.startsAt - startsAt - lift.minutes : FAR;
  if (next && lift.heavyLower && before < FAR) {
    const text = `Ends ${hoursText(before)} before ${next.title}; house rule asks ${rules["heavy-before-hard.hours"]} h.`;
    reasons.push({ rule: "heavy-before-hard", text });
  }
  const last = hard.lastBefore(startsAt);
  const after = last ? startsAt - last.endsAt : FAR;
  if (last && after < FAR) {
    const asked = Math.max(
      rules["lift-after-hard.hours"],
      lift.heavyLower ? rules["heavy-after-hard.hours"] : 0,
    );
    const text = `Starts ${hoursText(after)} after ${last.title}; house rule asks ${asked} h.`;
    reasons.push({ rule: "lift-after-hard", text });
  }
  return reasons;
}

/**
 * Why a placed lift stands where it stands: what a coach would ask first. Nothing of where it was published: a lift reads
 * the same whatever its plan was measured against, and a knock-on tells of moves.
 */
export function reasonsFor(
  around: Surroundings,
  slot: Slot,
  { day, start, startsAt }: Candidate,
): readonly Reason[] {
  const lift = liftingOf(slot);
  const reasons = sparringReasons(around, lift, startsAt);
  for (const { rule, text } of new SlotDay(around, lift, around.dayOf(day)).payments(startsAt, start)) {
    // Spread is paid here only against lifts that stand; as days pass more of them do, and the words would change with them.
    if (rule !== "spread") reasons.push({ rule, text });
  }
  if (reasons.length === 0) reasons.push({ rule: "spread", text: "Where the week costs least." });
  return reasons;
}

/** What keeps a place from being taken: the must rules it breaks, else the lift of the day, else what it would pay. */
export function whyNot(
  around: Surroundings,
  slot: Slot,
  day: Day,
  start: Minute,
  others: readonly { readonly slot: Slot; readonly day: Day }[],
): readonly Reason[] {
  const rules = new SlotDay(around, liftingOf(slot), around.dayOf(day));
  const startsAt = around.dayOf(day).at(start);
  const breaks = rules.breaks(startsAt, start);
  if (breaks.length > 0) return breaks.map(({ rule, text }) => ({ rule, text }));
  const payments = rules.payments(startsAt, start).map(({ rule, text }) => ({ rule, text }));
  const taken = others.find((other) => other.day === day && other.slot.id !== slot.id);
  if (!taken) return payments;
  return [{ rule: "one-lift", text: `${ITEM_TITLES[taken.slot.item]} has that day now.` }, ...payments];
}

/** Why an item with legal candidates stays out: what the chosen lifts leave of them. */
export function neededByOthers(
  problem: PlacementProblem,
  item: number,
  chosen: readonly Candidate[],
): Reason | null {
  const own = problem.candidates.filter((candidate) => candidate.item === item);
  if (own.length === 0) return null;
  const days = new Set(chosen.map(({ day }) => day));
  const sameDay = own.filter(({ day }) => days.has(day)).length;
  const rule = 2 * sameDay >= own.length || !problem.items[item]?.heavy ? "one-lift" : "heavy-apart";
  const text = `${own.length} ${own.length === 1 ? "start" : "starts"} left by the rules, and all needed by lifts that come first.`;
  return { rule, text };
}
