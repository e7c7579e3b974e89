/** Gravity, m/s2, as the published worked values use it. */
export const GRAVITY = 9.81;

/**
 * Jump height, m, of a flight of `seconds`: g t^2 / 8, for a body that lands as it took off. Standard ballistics.
 * Landing with bent legs lengthens the flight and flatters the jump.
 */
export const heightOfFlight = (seconds: number): number => (GRAVITY * seconds ** 2) / 8;

/** Flight, s, of a jump of `height` m: the inverse of `heightOfFlight`. */
export const flightOfHeight = (height: number): number => Math.sqrt((8 * height) / GRAVITY);

/** Speed at take-off, m/s, of a jump of `height` m. */
export const takeOffSpeed = (height: number): number => Math.sqrt(2 * GRAVITY * height);

export const REACTIVE_METHODS = ["height-over-contact", "flight-over-contact"] as const;
export type ReactiveMethod = (typeof REACTIVE_METHODS)[number];

/** Reactive strength with the method it was worked out by: the two give different numbers for one jump. */
export interface ReactiveStrength {
  readonly method: ReactiveMethod;
  readonly title: string;
  readonly value: number;
  /** m/s, or a plain ratio. */
  readonly unit: "m/s" | "ratio";
  readonly source: string;
}

const SOURCE = "Flanagan & Comyns 2008, Strength Cond J 30(5):32-38 (from memory)";

/** Reactive strength of a jump by flight and contact, both in seconds. Null without a contact above 0. */
export function reactiveStrength(
  method: ReactiveMethod,
  flight: number,
  contact: number,
): ReactiveStrength | null {
  if (!(contact > 0) || !(flight >= 0)) return null;
  return method === "height-over-contact"
    ? {
        method,
        title: "Jump height over contact time",
        value: heightOfFlight(flight) / contact,
        unit: "m/s",
        source: SOURCE,
      }
    : {
        method,
        title: "Flight time over contact time",
        value: flight / contact,
        unit: "ratio",
        source: SOURCE,
      };
}
