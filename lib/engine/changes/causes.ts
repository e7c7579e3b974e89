import { itemSpec, liftsOfWeek, menuOf, type Layout } from "../menu";
import type { CampFrame } from "../phases";
import type { Base, Cause, Day, Lift, Minute, Reason } from "../types";
import { weekOfBaseLift } from "./base";

/** The rules that shut the place a lift had, or make it dear; none where it fell to another lift. */
export type WhyLeft = (id: string, day: Day, start: Minute) => readonly Reason[];

const MADE_ROOM: readonly Reason[] = [{ rule: "spread", text: "The lifts of the week lie better this way." }];

function whyMoved(lift: Lift, was: Lift, whyLeft: WhyLeft): readonly Reason[] {
  // A pin says why it stands here, and nothing shut the place it left.
  if (lift.pinned) return lift.reasons;
  const reasons = whyLeft(lift.id, was.day, was.start);
  return reasons.length > 0 ? reasons : MADE_ROOM;
}

const PHASE_WEEKS = {
  foundation: "A foundation week",
  strength: "A strength week",
  power: "A power week",
  taper: "A taper week",
} as const;

/** Why a lift of the base is not in the camp any more. */
function whyDropped(frame: CampFrame, base: Base, lift: Lift, hardDays: ReadonlyMap<number, number>): Reason {
  const { athlete, bout, rules } = frame.input;
  if (lift.day > bout.day) return { rule: "camp", text: "The bout comes before it now." };
  const week = frame.weeks.find((row) => row.weeksOut === weekOfBaseLift(lift, base, frame.input));
  if (!week) return { rule: "camp", text: "Its week is not part of the camp now." };
  const menu = menuOf(week);
  if (!menu.includes(lift.item)) {
    const titles = menu.map((item) => itemSpec(item).title).join(", ");
    const name = week.weeksOut === 0 ? "Fight week" : PHASE_WEEKS[week.phase];
    return { rule: "menu", text: `${name} holds ${titles}.` };
  }
  const hard = hardDays.get(week.weeksOut) ?? 0;
  const most = Math.min(menu.length, athlete.liftsPerWeek);
  const lifts = liftsOfWeek(most, hard, rules["hard-days.off"]);
  if (lifts < most) {
    return { rule: "hard-days.off", text: `${hard} days of hard sparring that week take one lift off.` };
  }
  return {
    rule: "menu",
    text: `The week holds ${lifts} ${lifts === 1 ? "lift" : "lifts"}, and others come first.`,
  };
}

function whyAdded(frame: CampFrame, lift: Lift): Reason {
  if (lift.pinned) return { rule: "pin", text: "Pinned by the coach." };
  const week = frame.weekOf(lift.week, lift.day);
  const name = week.weeksOut === 0 ? "Fight week" : PHASE_WEEKS[week.phase];
  return { rule: "menu", text: `${name} with room for it.` };
}

/** Why lifts of the base moved or went, and why new ones came. */
export function causesOf(
  frame: CampFrame,
  base: Base,
  layout: Layout,
  lifts: readonly Lift[],
  whyLeft: WhyLeft,
): readonly Cause[] {
  const before = new Map(base.lifts.map((lift) => [lift.id, lift]));
  const causes: Cause[] = [];
  for (const lift of lifts) {
    const was = before.get(lift.id);
    if (!was) causes.push({ id: lift.id, because: [whyAdded(frame, lift)] });
    else if (was.day !== lift.day || was.start !== lift.start) {
      causes.push({ id: lift.id, because: whyMoved(lift, was, whyLeft) });
    }
  }
  for (const lift of layout.dropped) {
    causes.push({ id: lift.id, because: [whyDropped(frame, base, lift, layout.hardDays)] });
  }
  return causes;
}
