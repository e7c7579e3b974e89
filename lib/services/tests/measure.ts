import { TEST_SPECS, reactiveStrength, type TestKind, type TestSide } from "@/lib/engine/measures";

/** What of a trial is compared from day to day. */
export interface Measured {
  readonly title: string;
  readonly unit: string;
}

/** A reactive jump is compared by reactive strength: flight alone hides a slow contact. */
const REACTIVE = "height-over-contact";

export function measuredOf(kind: TestKind): Measured {
  const { value } = TEST_SPECS[kind];
  return kind === "reactive-jump"
    ? { title: "Reactive strength, jump height over contact time", unit: "m/s" }
    : { title: value.title, unit: value.unit };
}

/** The number that is compared, in the unit of `measuredOf`. Times of trials are in milliseconds. */
export function measureOf(kind: TestKind, value: number, second: number | null): number {
  if (kind !== "reactive-jump" || second === null) return value;
  return reactiveStrength(REACTIVE, value / 1000, second / 1000)?.value ?? 0;
}

/** What trials must share to be compared. */
export interface SeriesKey {
  readonly kind: TestKind;
  readonly side: TestSide;
  readonly at: number | null;
}

export const seriesKeyOf = (kind: TestKind, side: TestSide, second: number | null): SeriesKey => ({
  kind,
  side,
  at: TEST_SPECS[kind].comparesAtSame ? second : null,
});

export const keyText = ({ kind, side, at }: SeriesKey): string => `${kind} ${side} ${at ?? ""}`.trim();
