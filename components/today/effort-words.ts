/**
 * Words of the modified CR-10 scale: Foster et al. 2001, J Strength Cond Res 15(1):109-115. 6, 8 and 9 have none.
 */
export const EFFORT_WORDS: readonly (string | null)[] = [
  "rest",
  "very, very easy",
  "easy",
  "moderate",
  "somewhat hard",
  "hard",
  null,
  "very hard",
  null,
  null,
  "maximal",
];

/** "7, very hard"; a rating without a word stands alone. */
export function effortText(effort: number): string {
  const word = EFFORT_WORDS[effort];
  return word ? `${effort}, ${word}` : String(effort);
}
