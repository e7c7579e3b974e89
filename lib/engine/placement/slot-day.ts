import { MUST_RULES } from "../rules/must-rules";
import type { PlacementRuleId, Pricing, Shut } from "../rules/placement-rule";
import { SHOULD_RULES } from "../rules/should-rules";
import type { Day, Minute } from "../types";
import type { ShutCount } from "./shut-count";
import type { Lifting, Surroundings } from "./surroundings";

/**
 * Most that should rules may take from one place, points. Whatever prices a team sets, a lift is not left out to save them:
 * see the prices of unplaced lifts.
 */
export const MOST_OWN_COST = 4_000;

/** A must rule broken. */
export interface Break {
  readonly rule: PlacementRuleId;
  readonly ids: readonly string[];
  readonly text: string;
}

/** A should rule paid. */
export interface Payment {
  readonly rule: PlacementRuleId;
  readonly points: number;
  readonly text: string;
}

const shutsAt = ({ from, to, onClock }: Shut, startsAt: number, start: Minute): boolean => {
  const at = onClock ? start : startsAt;
  return at >= from && at < to;
};

const isWholeDay = ({ from, to }: Shut): boolean =>
  from === Number.NEGATIVE_INFINITY && to === Number.POSITIVE_INFINITY;

/** What the rules say of one lift on one day: worked out once, asked for every start. */
export class SlotDay {
  readonly #shuts: { readonly rule: PlacementRuleId; readonly shut: Shut }[] = [];
  readonly #pricings: { readonly rule: PlacementRuleId; readonly pricing: Pricing }[] = [];
  #moving: Pricing | null = null;
  /** Rules that shut the whole day. */
  readonly shutBy = new Set<PlacementRuleId>();

  constructor(
    around: Surroundings,
    readonly lift: Lifting,
    day: Day,
  ) {
    for (const rule of MUST_RULES) {
      for (const shut of rule.shuts(around, lift, day)) {
        this.#shuts.push({ rule: rule.id, shut });
        if (isWholeDay(shut)) this.shutBy.add(rule.id);
      }
    }
    for (const rule of SHOULD_RULES) {
      const pricing = rule.pricing(around, lift, day);
      if (!pricing) continue;
      if (rule.id === "stay-put") this.#moving = pricing;
      else this.#pricings.push({ rule: rule.id, pricing });
    }
  }

  isOpen(startsAt: number, start: Minute): boolean {
    for (const { shut } of this.#shuts) if (shutsAt(shut, startsAt, start)) return false;
    return true;
  }

  /** Counts the rules that shut a start, each once. */
  countShut(startsAt: number, start: Minute, count: ShutCount): void {
    let counted: PlacementRuleId | null = null;
    for (const { rule, shut } of this.#shuts) {
      // Shuts of a rule follow one another.
      if (rule === counted || !shutsAt(shut, startsAt, start)) continue;
      counted = rule;
      count.add(rule, 1);
    }
  }

  /** What a start costs by itself, whole points. */
  points(startsAt: number, start: Minute): number {
    let own = 0;
    for (const { pricing } of this.#pricings) own += pricing.points(startsAt, start);
    return Math.min(own, MOST_OWN_COST) + (this.#moving?.points(startsAt, start) ?? 0);
  }

  breaks(startsAt: number, start: Minute): readonly Break[] {
    return this.#shuts
      .filter(({ shut }) => shutsAt(shut, startsAt, start))
      .map(({ rule, shut }) => ({ rule, ids: shut.ids, text: shut.text(startsAt, start) }));
  }

  /** What a start pays, but for moving. */
  payments(startsAt: number, start: Minute): readonly Payment[] {
    return this.#pricings.flatMap(({ rule, pricing }) => {
      const points = pricing.points(startsAt, start);
      return points > 0 ? [{ rule, points, text: pricing.text(startsAt, start) }] : [];
    });
  }
}
