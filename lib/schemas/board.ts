import type { Phase } from "@/lib/engine/types";

/** In the order in which they are shown. */
export const FLAG_KINDS = [
  "hold",
  "knock",
  "pain",
  "request",
  "weight",
  "check-in",
  "missed",
  "load",
  "unplaced",
  "rules",
  "suggestions",
] as const;
export type FlagKind = (typeof FLAG_KINDS)[number];

/** Something to look at, in words with its numbers. Nobody is given a score. */
export interface BoardFlag {
  readonly kind: FlagKind;
  readonly text: string;
}

export interface BoardMark {
  readonly id: string;
  readonly source: "lift" | "sport" | "bout" | "weigh-in";
  /** Item of a lift or kind of a sport session. */
  readonly kind: string;
  readonly title: string;
  /** HH:MM. */
  readonly start: string;
  /** Null where nothing was logged, and for those who may not read logs. */
  readonly state: "done" | "missed" | null;
}

export interface BoardDay {
  readonly date: string;
  readonly marks: readonly BoardMark[];
}

export interface BoardAttendance {
  readonly sessionId: string;
  readonly title: string;
  readonly start: string;
  readonly state: "done" | "missed" | "not-yet" | "asked" | "excused";
}

/** "I can't make it", still to be answered. */
export interface WaitingRequest {
  readonly id: string;
  readonly campId: string;
  readonly sessionId: string;
  readonly source: BoardMark["source"];
  readonly title: string;
  readonly date: string;
  readonly start: string;
  readonly reason: string;
}

export interface BoardRow {
  readonly campId: string;
  readonly athlete: { readonly id: string; readonly name: string };
  readonly bout: { readonly date: string; readonly opponent: string; readonly place: string };
  readonly daysOut: number;
  /** Null before the camp begins. */
  readonly phase: Phase | null;
  readonly fightWeek: boolean;
  readonly onHold: boolean;
  /** Where the athlete is; the days of a row count from it. */
  readonly today: string;
  /** Three days back, today, ten days ahead. */
  readonly days: readonly BoardDay[];
  /** Today's sessions; null for those who may not read logs. */
  readonly attendance: readonly BoardAttendance[] | null;
  /** This camp week in AU: done, due by now (days gone by and what was answered today), planned in all. Null as above. */
  readonly load: { readonly done: number; readonly due: number; readonly planned: number } | null;
  readonly flags: readonly BoardFlag[];
  /** Empty for those who may not answer. */
  readonly requests: readonly WaitingRequest[];
}

export interface BoardView {
  /** Nearest bout first. */
  readonly rows: readonly BoardRow[];
  /** Sport sessions of today that two athletes or more are in. */
  readonly together: readonly {
    readonly title: string;
    readonly start: string;
    readonly names: readonly string[];
  }[];
}
