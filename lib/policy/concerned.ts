import type { KnockOn } from "@/lib/engine/types";
import type { Role } from "./roles";

/** A change as far as it decides whom it concerns: what it knocks on to, and what it wrote. */
export interface ConcernedChange {
  readonly knockOn: KnockOn;
  readonly edit: { readonly bout?: unknown; readonly weighIn?: unknown; readonly status?: unknown };
}

/**
 * Whom a saved change concerns, by role: the athlete and the coaches of lifting always, the skills coach where a sport
 * session or the bout changed, the medic and a guest where the bout, its place or the weigh-in changed or it is off. Athletes
 * and guests count only for their own camp; the caller sees to that, and leaves out the one who saved.
 */
export function concerns(role: Role, { knockOn, edit }: ConcernedChange): boolean {
  const bout =
    knockOn.bout !== null ||
    edit.bout !== undefined ||
    edit.weighIn !== undefined ||
    edit.status !== undefined;
  const sport = knockOn.sport.length > 0;
  switch (role) {
    case "athlete":
    case "head":
    case "strength":
      return bout || sport || knockOn.lifts.length > 0;
    case "skills":
      return bout || sport;
    case "medic":
    case "guest":
      return bout;
  }
}
