import type { CheckIn } from "./today";
import type { BoutResult } from "./result";

/** What stands on an athlete's page beside the profile. Kilograms and AU; a section the reader may not see is null. */

export interface WeightPoint {
  readonly date: string;
  readonly kg: number;
}

export type WeightRecord =
  | { readonly off: "minor"; readonly reason: string }
  | {
      readonly off: null;
      readonly weights: readonly WeightPoint[];
      /** Way to the limit of the nearest bout with a weigh-in to come; null without one. */
      readonly to: {
        readonly campId: string;
        readonly limitKg: number;
        readonly weighIn: string;
        /** One point a day; empty where there is no weight to start from. */
        readonly line: readonly WeightPoint[];
        readonly pace: string | null;
        readonly ceilings: readonly { readonly date: string; readonly hours: number; readonly kg: number }[];
        readonly remarks: readonly { readonly text: string; readonly source: string }[];
      } | null;
    };

/** AU. */
export interface LoadDay {
  readonly date: string;
  readonly plannedSport: number;
  readonly plannedLifting: number;
  readonly doneSport: number;
  readonly doneLifting: number;
}

/** Seven days. */
export interface LoadWeek {
  readonly from: string;
  readonly to: string;
  readonly planned: number;
  /** Null where no session was logged as done. */
  readonly done: number | null;
  /** Of what was done; null where it cannot be worked out. */
  readonly monotony: number | null;
  readonly strain: number | null;
}

export interface LoadRecord {
  readonly days: readonly LoadDay[];
  readonly weeks: readonly LoadWeek[];
}

export type CheckInPart = keyof CheckIn;

export interface CheckInRecord {
  /** First and last day of the window. */
  readonly from: string;
  readonly to: string;
  readonly days: readonly (CheckIn & { readonly date: string })[];
  /** The athlete's own mean and sample SD over the window; null where there is none. */
  readonly own: Readonly<Record<CheckInPart, { readonly mean: number; readonly sd: number | null } | null>>;
}

export interface CampLine {
  readonly id: string;
  readonly on: boolean;
  readonly bout: string;
  readonly place: string;
  readonly opponent: string;
  readonly weeks: number;
  readonly result: BoutResult["result"] | null;
}

export interface AthleteRecord {
  readonly unit: "kg" | "lb";
  /** Civil day where the athlete is. */
  readonly today: string;
  readonly weight: WeightRecord | null;
  readonly load: LoadRecord | null;
  readonly checkIns: CheckInRecord | null;
  readonly camps: readonly CampLine[] | null;
}

/** GET /api/athletes/:id/csv/:what */
export const CSV_KINDS = ["tests", "weights", "check-ins", "load", "bests"] as const;
export type CsvKind = (typeof CSV_KINDS)[number];
