const COMMON = "common practice, no published source";

export type RuleGroup = "must" | "should" | "camp" | "dose" | "load" | "response" | "weight" | "form";

/** One threshold. */
export interface Setting {
  readonly title: string;
  readonly group: RuleGroup;
  readonly unit: string;
  readonly value: number;
  readonly min: number;
  readonly max: number;
  /** Smallest useful step, for forms. */
  readonly step: number;
  readonly reason: string;
  readonly source: string;
}

/** `source` is left out where nothing is published. */
export const setting = (
  group: RuleGroup,
  title: string,
  value: number,
  unit: string,
  [min, max, step]: readonly [number, number, number],
  reason: string,
  source: string = COMMON,
): Setting => ({ group, title, value, unit, min, max, step, reason, source });
