import type { Day, Factor, PlanInput } from "../types";

/** However many suggestions were accepted, half the sets stay: common practice, no published source. */
const LEAST = 0.5;

/**
 * What accepted suggestions leave of the sets of a day: the product of those that cover it, never below a half. The text
 * says since when and until when, not why: more people read a session than may read check-ins.
 */
export function responseFactor({ responses, bout }: Pick<PlanInput, "responses" | "bout">, day: Day): Factor {
  const covering = responses.filter(({ from, to, factor }) => from <= day && day <= to && factor < 1);
  // Sorted: a product of binary fractions depends on the order, and a plan must not.
  const product = covering
    .map(({ factor }) => factor)
    .sort((a, b) => a - b)
    .reduce((value, factor) => value * factor, 1);
  const [one] = covering;
  const daysOut = (at: Day): number => Math.max(0, bout.day - at);
  const text = !one
    ? "No suggestion accepted"
    : covering.length > 1
      ? `${covering.length} suggestions were accepted, fewer sets on these days`
      : one.from === one.to
        ? `A suggestion was accepted, fewer sets ${daysOut(one.from)} days out`
        : `A suggestion was accepted, fewer sets from ${daysOut(one.from)} to ${daysOut(one.to)} days out`;
  return { name: "response", value: Math.max(LEAST, product), text };
}
