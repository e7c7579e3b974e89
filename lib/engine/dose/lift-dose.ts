import type { Factor } from "../types";
import { roundHalfUp } from "./sets";

/** What the dose of one lift is made of; `share` is the week's bound on taper x before x after. */
export interface DoseParts {
  readonly baseSets: number;
  readonly floorSets: number;
  readonly wave: Factor;
  readonly taper: Factor;
  readonly before: Factor;
  readonly after: Factor;
  readonly response: Factor;
  readonly coach: Factor;
  /** Before x after, with hard sparring within a day left out; null where none is that near. */
  readonly sparringFar: number | null;
  /** Which side the hard sparring of that day is on. */
  readonly nearSide: "before" | "after";
  readonly share: number;
  readonly capText: string;
}

export interface Dose {
  readonly sets: number;
  /** In the order they are multiplied: max(floor, round(base x all of them)) is the sets. */
  readonly factors: readonly Factor[];
}

/**
 * Sets before taper, sparring, cap and accepted suggestions. The week's share is worked out from these: what a suggestion takes
 * off one session is not handed to the others, so that accepting one never raises a set.
 */
export const fullSets = ({ baseSets, wave, coach }: Pick<DoseParts, "baseSets" | "wave" | "coach">): number =>
  baseSets * wave.value * coach.value;

/**
 * Sets of one lift. A lift within a day of hard sparring gives up at least one set against what it would hold without that
 * sparring, so that adding a hard day always shows, also where rounding would hide it.
 */
export function doseOf(parts: DoseParts): Dose {
  const { wave, taper, before, after, response, coach, share, floorSets } = parts;
  const full = fullSets(parts) * response.value;
  const reduced = taper.value * before.value * after.value;
  const cap = Math.min(1, share / reduced);
  const rounded = roundHalfUp(full * Math.min(reduced, share));
  const limit =
    parts.sparringFar === null
      ? Infinity
      : roundHalfUp(full * Math.min(taper.value * parts.sparringFar, share)) - 1;
  const sets = Math.max(floorSets, Math.min(rounded, limit));
  // Where that one set binds, the factor says so: the product of all factors stays what the sets come from.
  const shown = (factor: Factor): Factor =>
    sets < rounded && factor.name === parts.nearSide
      ? {
          ...factor,
          value: (factor.value * sets) / (full * Math.min(reduced, share)),
          text: `${factor.text}, a set less at least`,
        }
      : factor;
  const capFactor: Factor = {
    name: "cap",
    value: cap,
    text: cap < 1 ? parts.capText : "Within the week's load",
  };
  return { sets, factors: [wave, taper, shown(before), shown(after), capFactor, response, coach] };
}
