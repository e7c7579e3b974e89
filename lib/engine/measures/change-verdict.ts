import { leastRealChange } from "./reliability";

/** What can be said of a change from one test to another. */
export interface ChangeVerdict {
  /** Last minus first, in the test's unit. */
  readonly change: number;
  /** Least change beyond noise at 95 %; null where no error is known. */
  readonly leastReal: number | null;
  /** Null where no error is known. */
  readonly beyondNoise: boolean | null;
  /** For the better and at least the smallest worthwhile change; null where that is not known. */
  readonly worthHaving: boolean | null;
  /** Parts of a sentence, in this order: "Higher, beyond the noise of this test, and worth having". */
  readonly words: {
    readonly direction: string;
    readonly noise: string;
    readonly worth: string | null;
  };
}

const worthWords = (change: number, better: boolean, swc: number): string => {
  if (Math.abs(change) < swc) return "smaller than the smallest worthwhile change";
  return better ? "worth having" : "a loss that matters";
};

/**
 * Holds a change against the noise of the test and against what is worth having. `typicalError` and `swc` (smallest
 * worthwhile change) are in the test's unit; null where nobody knows them yet. Beyond noise is |change| > 1.96 x sqrt(2) x
 * typical error: to exceed the typical error alone happens about every second time by noise. Hopkins 2000, Sports Med 30:1-15.
 */
export function changeVerdict(
  first: number,
  last: number,
  typicalError: number | null,
  swc: number | null = null,
  higherIsBetter = true,
): ChangeVerdict {
  const change = last - first;
  const leastReal = typicalError === null ? null : leastRealChange(typicalError);
  const beyondNoise = leastReal === null ? null : Math.abs(change) > leastReal;
  const better = higherIsBetter ? change > 0 : change < 0;
  return {
    change,
    leastReal,
    beyondNoise,
    worthHaving: swc === null ? null : better && Math.abs(change) >= swc,
    words: {
      direction: change === 0 ? "Unchanged" : change > 0 ? "Higher" : "Lower",
      noise:
        beyondNoise === null
          ? "no error of this test is known yet"
          : beyondNoise
            ? "beyond the noise of this test"
            : "not beyond the noise of this test",
      worth: swc === null ? null : worthWords(change, better, swc),
    },
  };
}

/** The whole sentence of a verdict, with its full stop. */
export function verdictSentence({ words, beyondNoise }: ChangeVerdict): string {
  if (words.worth === null) return `${words.direction}, ${words.noise}.`;
  // What a noisy test cannot tell is not called a gain or a loss outright.
  const worth = beyondNoise === true ? words.worth : `if it is real, ${words.worth}`;
  return `${words.direction}, ${words.noise}; ${worth}.`;
}
