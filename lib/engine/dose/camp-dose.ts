import { instantAt, weeksOutOf } from "../geometry";
import { sessionLoad } from "../load";
import { itemSpec } from "../menu";
import type { CampFrame } from "../phases";
import type { Au, Day, Factor, Instant, Item, Lift, Minute } from "../types";
import { capShare, loadCap } from "./cap";
import { doseOf, fullSets, type Dose, type DoseParts } from "./lift-dose";
import { responseFactor } from "./response";
import { roundHalfUp, sessionMinutes } from "./sets";
import { afterFactor, beforeFactor, hardSessions, sparringGaps, type HardSession } from "./sparring";
import { taperFactor } from "./taper";
import { waveFactor } from "./wave";

/** A lift that has its place and wants its sets. */
export interface PlacedLift {
  readonly id: string;
  readonly item: Item;
  /** Weeks out of its slot. */
  readonly week: number;
  readonly day: Day;
  readonly start: Minute;
  /** Reserved minutes: the gap to sparring is measured from where they end. */
  readonly minutes: number;
}

export interface CampDose {
  readonly doses: ReadonlyMap<string, Dose>;
  /** By weeks out: the load that the week may reach, null where no cap applies. */
  readonly caps: ReadonlyMap<number, Au | null>;
}

const hours = (value: number): string => `${Math.round(value)} h`;

function beforeText(value: number, gap: number, far: number): string {
  return value < 1 ? `Ends ${hours(gap)} before hard sparring` : `No hard sparring within ${far} h after it`;
}

function afterText(value: number, gap: number, far: number): string {
  return value < 1
    ? `Starts ${hours(gap)} after hard sparring`
    : `No hard sparring within ${far} h before it`;
}

function taperPart(frame: CampFrame, day: Day): Factor {
  const t = frame.taperDay(day);
  if (t < 1) return { name: "taper", value: 1, text: "Before the taper" };
  return { name: "taper", value: taperFactor(t, frame.tau), text: `Day ${t} of the taper` };
}

type Uncapped = Omit<DoseParts, "share" | "capText">;

function partsOf(frame: CampFrame, lift: PlacedLift, hard: readonly HardSession[]): Uncapped {
  const { input } = frame;
  const { rules } = input;
  const spec = itemSpec(lift.item);
  const startsAt = instantAt(input.zone, lift.day, lift.start);
  const gaps = sparringGaps({ startsAt, endsAt: (startsAt + lift.minutes) as Instant }, hard, rules);
  const before = beforeFactor(gaps.before, rules);
  const after = afterFactor(gaps.after, rules);
  const coach = input.coachFactors[lift.id] ?? 1;
  return {
    baseSets: spec.sets,
    floorSets: spec.floor,
    wave: waveFactor(frame.weekOf(lift.week, lift.day), rules),
    taper: taperPart(frame, lift.day),
    before: { name: "before", value: before, text: beforeText(before, gaps.before, rules["before.far"]) },
    after: { name: "after", value: after, text: afterText(after, gaps.after, rules["after.far"]) },
    response: responseFactor(input, lift.day),
    coach: {
      name: "coach",
      value: coach,
      text: coach === 1 ? "No factor set by the coach" : "Set by the coach",
    },
    sparringFar:
      gaps.nearBefore || gaps.nearAfter
        ? beforeFactor(gaps.beforeFar, rules) * afterFactor(gaps.afterFar, rules)
        : null,
    nearSide: gaps.nearBefore ? "before" : "after",
  };
}

/**
 * Sets of all lifts of a camp, week by week: the cap of a week needs the loads of the weeks before it. Past lifts count
 * with the load they had. Weeks count from the first that holds a lift; that one has no cap.
 */
export function doseCamp(
  frame: CampFrame,
  lifts: readonly PlacedLift[],
  past: readonly Lift[],
  sportLoads: ReadonlyMap<number, number>,
): CampDose {
  const { rules, bout } = frame.input;
  const hard = hardSessions(frame.input);
  const doses = new Map<string, Dose>();
  const caps = new Map<number, Au | null>();
  const loadsBefore: number[] = [];
  for (const { weeksOut } of frame.weeks) {
    const inWeek = ({ day }: { readonly day: Day }): boolean => weeksOutOf(bout.day, day) === weeksOut;
    const own = lifts
      .filter(inWeek)
      .map((lift) => ({ lift, spec: itemSpec(lift.item), parts: partsOf(frame, lift, hard) }));
    const done = past.filter(inWeek);
    caps.set(weeksOut, null);
    if (loadsBefore.length === 0 && own.length + done.length === 0) continue;
    const fixed =
      (sportLoads.get(weeksOut) ?? 0) +
      done.reduce((sum, lift) => sum + sessionLoad(lift.effort, lift.minutes), 0);
    const load = (effort: number, sets: number): number => sessionLoad(effort, sessionMinutes(sets, rules));
    const loadAt = (share: number): number =>
      own.reduce(
        (sum, { parts, spec }) =>
          sum + load(spec.effort, Math.max(parts.floorSets, roundHalfUp(fullSets(parts) * share))),
        0,
      );
    const cap = loadCap(loadsBefore, rules);
    caps.set(weeksOut, cap as Au | null);
    const share = cap === null ? 1 : capShare(cap - fixed, rules["cap.floor"], loadAt);
    const capText = `Week held to ${Math.round(cap ?? 0)} AU, ${Math.round(rules["cap.ramp"] * 100)} % over the weeks before`;
    let lifting = 0;
    for (const { lift, spec, parts } of own) {
      const dose = doseOf({ ...parts, share, capText });
      doses.set(lift.id, dose);
      lifting += load(spec.effort, dose.sets);
    }
    loadsBefore.push(fixed + lifting);
  }
  return { doses, caps };
}
