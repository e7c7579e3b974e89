import { MUST_RULES } from "../rules/must-rules";
import type { HouseRules, Reason } from "../types";
import type { Lifting } from "./surroundings";

/** "past" is no rule of the house: what has begun cannot be planned. */
const PAST = "past";

/** How many of a lift's starts each rule shut. A start that several rules shut counts for each of them. */
export class ShutCount {
  readonly #counts = new Map<string, number>();
  #tried = 0;

  tried(starts: number): void {
    this.#tried += starts;
  }

  add(rule: string, starts: number): void {
    this.#counts.set(rule, (this.#counts.get(rule) ?? 0) + starts);
  }

  past(): void {
    this.add(PAST, 1);
  }

  /** Most frequent first, in words. */
  reasons(lift: Lifting, rules: HouseRules): readonly Reason[] {
    const keepsFrom = new Map<string, string>(
      MUST_RULES.map((rule) => [rule.id, rule.keepsFrom(rules, lift)]),
    );
    return [...this.#counts]
      .sort(([a, x], [b, y]) => y - x || (a < b ? -1 : 1))
      .map(([rule, count]) => {
        const share = count >= this.#tried ? "every start" : `${count} of ${this.#tried} starts`;
        return { rule, text: `${keepsFrom.get(rule) ?? "Already past"}: ${share}.` };
      });
  }
}
