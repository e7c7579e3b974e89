export interface Point {
  readonly x: number;
  readonly y: number;
}

/** Shorter is a tap that slipped, CSS pixels. Common practice, no published source. */
const LEAST = 60;

/** What a finger's way means: 1 is the next day (to the left), -1 the day before, 0 nothing or a scroll. */
export function swipeOf(from: Point, to: Point): -1 | 0 | 1 {
  const dx = to.x - from.x;
  const dy = to.y - from.y;
  // Twice as far across as along: a scroll is never exactly upright.
  if (Math.abs(dx) < LEAST || Math.abs(dx) < 2 * Math.abs(dy)) return 0;
  return dx < 0 ? 1 : -1;
}
