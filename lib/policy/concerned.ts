import type { KnockOn } from "@/lib/engine/types";
import type { Role } from "./roles";

const touchesLifting = (knockOn: KnockOn): boolean => knockOn.lifts.length > 0;
const touchesSport = (knockOn: KnockOn): boolean => knockOn.sport.length > 0;
const touchesBout = (knockOn: KnockOn): boolean => knockOn.bout !== null;

/**
 * Whom a saved change concerns, by role: the athlete and the coaches of lifting always, the skills coach where a sport
 * session or the bout moved, the medic and a guest where the bout moved. Athletes and guests count only for their own camp;
 * the caller sees to that, and leaves out the one who saved.
 */
export function concerns(role: Role, knockOn: KnockOn): boolean {
  const any = touchesLifting(knockOn) || touchesSport(knockOn) || touchesBout(knockOn);
  switch (role) {
    case "athlete":
    case "head":
    case "strength":
      return any;
    case "skills":
      return touchesSport(knockOn) || touchesBout(knockOn);
    case "medic":
    case "guest":
      return touchesBout(knockOn);
  }
}
