import {
  NO_PUBLISHED_ERROR,
  OWN_ERROR_LEAST,
  TEST_SPECS,
  ownTypicalError,
  smallestWorthwhile,
  type TestKind,
} from "@/lib/engine/measures";
import { measureText } from "@/lib/format/measure";
import type { TestError } from "@/lib/schemas/test-trial";
import { measuredOf } from "./measure";

/**
 * The error of one measurement: the athlete's own where there are enough repeated trials, else a published one where the
 * kind has one, else none. `days` are what was measured on each day.
 */
export function errorOf(kind: TestKind, days: readonly (readonly number[])[]): TestError {
  const { unit } = measuredOf(kind);
  const own = ownTypicalError(days);
  if (own && own.typicalError > 0) {
    return {
      typicalError: own.typicalError,
      from: "own",
      text: `Typical error ${measureText(own.typicalError, unit)}, from this athlete's own repeated trials within a day (${own.degrees} degrees of freedom). From day to day it is larger. Hopkins 2000, Sports Med 30:1-15.`,
    };
  }
  const published = TEST_SPECS[kind].typicalError;
  if (published) {
    return {
      typicalError: published.value,
      from: "published",
      text: `Typical error ${measureText(published.value, unit)}, published: ${published.source}.`,
    };
  }
  const why = own
    ? "All repeated trials are equal: the test was read too coarsely to show its error."
    : `It takes repeated trials: ${OWN_ERROR_LEAST} beyond the first of each day.`;
  return { typicalError: null, from: "unknown", text: `Typical error unknown. ${NO_PUBLISHED_ERROR} ${why}` };
}

/** Fewest athletes whose spread says something, and hides each of them: common practice, no published source. */
export const LEAST_PEOPLE = 6;

/** Smallest worthwhile change from the spread between the team's athletes. `people` are one number each. */
export function worthwhileOf(
  kind: TestKind,
  people: readonly number[],
  typicalError: number | null,
): { readonly value: number | null; readonly text: string } {
  const unknown = (why: string) => ({ value: null, text: `Smallest worthwhile change unknown: ${why}` });
  if (typicalError === null) return unknown("the error of the test has to be known first.");
  if (people.length < LEAST_PEOPLE)
    return unknown(`it takes ${LEAST_PEOPLE} athletes of the team with this test.`);
  const value = smallestWorthwhile(people, typicalError);
  if (value === null) return unknown("the team's spread is no larger than the error of the test.");
  return {
    value,
    text: `Smallest worthwhile change ${measureText(value, measuredOf(kind).unit)}: 0.2 of the spread between ${people.length} athletes of the team, the error taken out. Hopkins 2000, Sports Med 30:1-15.`,
  };
}
