/** Type sizes of the sheet, points: what a wall is read at, and what a long week may shrink to. */
export const LARGEST = 10.5;
export const SMALLEST = 4.5;
export const STEP = 0.25;

/** The largest size at which the sheet fits; the smallest where none does. `fits` tries one size. */
export function fittingSize(fits: (size: number) => boolean): number {
  for (let size = LARGEST; size > SMALLEST; size -= STEP) if (fits(size)) return size;
  return SMALLEST;
}
