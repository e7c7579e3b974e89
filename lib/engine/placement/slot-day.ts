import { MUST_RULES } from "../rules/must-rules";
import type { PlacementRuleId, Pricing, Shut } from "../rules/placement-rule";
import { SHOULD_RULES } from "../rules/should-rules";
import type { Minute } from "../types";
import type { CampDay } from "./camp-day";
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

interface Priced {
  readonly rule: PlacementRuleId;
  readonly pricing: Pricing;
}

/** What the rules say of one lift on one day: worked out once, asked for every start. */
export class SlotDay {
  readonly #shuts: Shut[] = [];
  #prices: { readonly own: readonly Priced[]; readonly moving: Pricing | null } | null = null;

  constructor(
    private readonly around: Surroundings,
    readonly lift: Lifting,
    readonly day: CampDay,
  ) {
    for (const rule of MUST_RULES) {
      for (const shut of rule.shuts(around, lift, day)) this.#shuts.push(shut);
    }
  }

  /** Rules that shut the whole day. */
  shutBy(): readonly PlacementRuleId[] {
    return [...new Set(this.#shuts.filter(isWholeDay).map(({ rule }) => rule))];
  }

  isOpen(startsAt: number, start: Minute): boolean {
    for (const shut of this.#shuts) if (shutsAt(shut, startsAt, start)) return false;
    return true;
  }

  /** Counts the rules that shut a start, each once. */
  countShut(startsAt: number, start: Minute, count: ShutCount): void {
    let counted: PlacementRuleId | null = null;
    for (const shut of this.#shuts) {
      // Shuts of a rule follow one another.
      if (shut.rule === counted || !shutsAt(shut, startsAt, start)) continue;
      counted = shut.rule;
      count.add(counted, 1);
    }
  }

  /** What a start costs by itself, whole points. */
  points(startsAt: number, start: Minute): number {
    const { own, moving } = this.#priced();
    let points = 0;
    for (const { pricing } of own) points += pricing.points(startsAt, start);
    return Math.min(points, MOST_OWN_COST) + (moving?.points(startsAt, start) ?? 0);
  }

  breaks(startsAt: number, start: Minute): readonly Break[] {
    return this.#shuts
      .filter((shut) => shutsAt(shut, startsAt, start))
      .map(({ rule, ids, text }) => ({ rule, ids, text: text(startsAt, start) }));
  }

  /** What a start pays, but for moving. */
  payments(startsAt: number, start: Minute): readonly Payment[] {
    return this.#priced().own.flatMap(({ rule, pricing }) => {
      const points = pricing.points(startsAt, start);
      return points > 0 ? [{ rule, points, text: pricing.text(startsAt, start) }] : [];
    });
  }

  /** Prices are asked for only where a start is open. */
  #priced(): { readonly own: readonly Priced[]; readonly moving: Pricing | null } {
    if (this.#prices) return this.#prices;
    const own: Priced[] = [];
    let moving: Pricing | null = null;
    for (const { id, pricing: pricingOf } of SHOULD_RULES) {
      const pricing = pricingOf(this.around, this.lift, this.day);
      if (!pricing) continue;
      if (id === "stay-put") moving = pricing;
      else own.push({ rule: id, pricing });
    }
    this.#prices = { own, moving };
    return this.#prices;
  }
}
