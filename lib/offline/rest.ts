/** A rest between sets: known by its end, so that a locked screen or a reload cannot lose it. */
export interface Rest {
  /** Milliseconds since 1970. */
  readonly endsAt: number;
  /** What follows: "Trap-bar deadlift, set 3". */
  readonly next: string;
  /** The end was already told. */
  readonly told: boolean;
}

/** A rest that ended so long ago belongs to another session, milliseconds. */
const FORGOTTEN = 30 * 60_000;

export const startRest = (now: number, seconds: number, next: string): Rest => ({
  endsAt: now + seconds * 1000,
  next,
  told: false,
});

/** Whole seconds left, or over: 0.2 s left still shows 1. Null once it is forgotten. */
export function restAt(rest: Rest, now: number): { readonly seconds: number; readonly over: boolean } | null {
  const left = rest.endsAt - now;
  if (left <= -FORGOTTEN) return null;
  return left > 0
    ? { seconds: Math.ceil(left / 1000), over: false }
    : { seconds: Math.floor((now - rest.endsAt) / 1000), over: true };
}

/** Longer or shorter by `seconds`; what is then over may be told again. */
export const stretchRest = (rest: Rest, seconds: number, now: number): Rest => {
  const endsAt = Math.max(rest.endsAt, now) + seconds * 1000;
  return { ...rest, endsAt, told: rest.told && endsAt <= now };
};

/** "2:05". */
export const clockText = (seconds: number): string =>
  `${Math.floor(seconds / 60)}:${String(seconds % 60).padStart(2, "0")}`;

/** What storage gave back; null for nothing or for what is none. */
export function readRest(text: string | null): Rest | null {
  if (text === null) return null;
  try {
    const given = JSON.parse(text) as Partial<Rest> | null;
    return typeof given?.endsAt === "number" && typeof given.next === "string"
      ? { endsAt: given.endsAt, next: given.next, told: given.told === true }
      : null;
  } catch {
    return null;
  }
}
