import { z } from "zod";
import type { PrescribedLift } from "@/lib/engine/prescription/types";
import type { Item } from "@/lib/engine/types";
import { civilDate } from "./civil";

/** What an athlete answers: logs, check-ins, weights, requests. Kilograms on the wire; the page shows the athlete's unit. */

const setSchema = z.object({
  /** Slot of the prescription, and number of the set in it from 1. */
  slot: z.string().min(1).max(40),
  number: z.int().min(1).max(30),
  exerciseId: z.string().min(1).max(80),
  /** Null for body mass. */
  kg: z.number().min(0, "0 to 500 kg.").max(500, "0 to 500 kg.").nullable(),
  /** Repetitions, or seconds of a hold. */
  reps: z.int("A whole number.").min(0, "0 to 600.").max(600, "0 to 600."),
  reserve: z.int("0 to 10.").min(0, "0 to 10.").max(10, "0 to 10.").nullable(),
});
export type LoggedSet = z.infer<typeof setSchema>;

export const sessionLogSchema = z
  .object({
    /** `open`: begun, not finished. */
    state: z.enum(["open", "done", "missed"]),
    /** CR-10. */
    effort: z.number("0 to 10.").min(0, "0 to 10.").max(10, "0 to 10.").nullable(),
    minutes: z.int("Whole minutes.").min(1, "1 to 600 minutes.").max(600, "1 to 600 minutes.").nullable(),
    hardRounds: z.int("Whole rounds.").min(0, "0 to 30.").max(30, "0 to 30.").nullable(),
    /** Took a knock to the head. Cannot be taken back by the athlete: the medic decides. */
    knock: z.boolean(),
    painPlace: z.string().trim().max(100, "At most 100 characters."),
    pain: z.int("0 to 10.").min(0, "0 to 10.").max(10, "0 to 10.").nullable(),
    note: z.string().trim().max(1000, "At most 1000 characters."),
    sets: z.array(setSchema).max(200),
  })
  .superRefine((log, issue) => {
    if (log.state === "done" && log.effort === null)
      issue.addIssue({ code: "custom", path: ["effort"], message: "Say how hard it was, 0 to 10." });
    if (log.state === "done" && log.minutes === null)
      issue.addIssue({ code: "custom", path: ["minutes"], message: "Say how long it took." });
    if (log.pain !== null && log.pain > 0 && log.painPlace === "")
      issue.addIssue({ code: "custom", path: ["painPlace"], message: "Say where it hurts." });
    const places = log.sets.map((set) => `${set.slot}/${set.number}`);
    if (new Set(places).size < places.length)
      issue.addIssue({ code: "custom", path: ["sets"], message: "A set is there twice." });
  });
export type SessionLog = z.infer<typeof sessionLogSchema>;

/** PUT /api/camps/:id/sessions/:sid/log */
export const saveLogSchema = z.object({
  /** Of this write: a retry with the same key changes nothing and answers the same. */
  key: z.uuid(),
  /** Version that the device edited; 0 for a first log. An older one gives 409 with the log as it stands. */
  baseVersion: z.int().min(0),
  log: sessionLogSchema,
});
export type SaveLog = z.infer<typeof saveLogSchema>;

export interface LogView extends SessionLog {
  readonly version: number;
  readonly loggedAt: string;
  readonly changedAt: string;
}

const answer = z.int("1 to 7.").min(1, "1 to 7.").max(7, "1 to 7.");
/** PUT /api/athletes/:id/check-ins/:date — 1 is very good, 7 is very poor. */
export const checkInSchema = z.object({ sleep: answer, fatigue: answer, soreness: answer, stress: answer });
export type CheckIn = z.infer<typeof checkInSchema>;

/** PUT /api/athletes/:id/weights/:date */
export const weightSchema = z.object({
  kg: z.number("20 to 300 kg.").min(20, "20 to 300 kg.").max(300, "20 to 300 kg."),
});

/** POST /api/camps/:id/sessions/:sid/request — "I can't make it". */
export const requestSchema = z.object({
  key: z.uuid(),
  reason: z.string().trim().min(1, "Say why, in a few words.").max(500, "At most 500 characters."),
});

/** POST /api/requests/:id/answer. Accepting changes no plan: the coach moves or drops the session on the camp page. */
export const requestAnswerSchema = z.object({
  state: z.enum(["accepted", "declined"]),
  answer: z.string().trim().max(500, "At most 500 characters."),
});

export const civilDateParam = civilDate;

export interface RequestView {
  readonly id: string;
  readonly reason: string;
  readonly state: "asked" | "accepted" | "declined" | "withdrawn";
  readonly answer: string;
}

/** What was done of an exercise the last time before this session. */
export interface LastTime {
  readonly date: string;
  readonly kg: number | null;
  readonly reps: number;
}

export interface DaySession {
  readonly campId: string;
  readonly id: string;
  readonly source: "lift" | "sport" | "bout" | "weigh-in";
  /** Item of a lift or kind of a sport session. */
  readonly kind: string;
  readonly title: string;
  readonly place: string;
  readonly date: string;
  /** HH:MM on the wall where it happens. */
  readonly start: string;
  readonly minutes: number;
  /** Expected, CR-10. */
  readonly effort: number;
  readonly item: Item | null;
  readonly sets: number | null;
  readonly prescription: PrescribedLift | null;
  /** By exercise id. */
  readonly lastTime: Readonly<Record<string, LastTime>>;
  readonly log: LogView | null;
  readonly request: RequestView | null;
  /** Last date on which the athlete may edit the log: the day after the session. */
  readonly editableUntil: string;
}

export interface AthleteDay {
  readonly date: string;
  /** Null without a camp that covers the day. */
  readonly daysOut: number | null;
  readonly sessions: readonly DaySession[];
  readonly checkIn: CheckIn | null;
  readonly kg: number | null;
}

/** Weight against the line; `off` says why there is none. */
export type WeightView =
  | { readonly off: "minor" | "no-limit" | "no-weight" }
  | {
      readonly off: null;
      readonly limitKg: number;
      readonly weighIn: string;
      /** The line on each day of the window. */
      readonly line: readonly { readonly date: string; readonly kg: number }[];
      /** What the engine says of the newest weight, in words, worst first. */
      readonly remarks: readonly { readonly kind: string; readonly text: string }[];
    };

/** GET /api/today: what the phone keeps for a basement: yesterday, today and the next seven days. */
export interface TodayView {
  readonly athlete: { readonly id: string; readonly name: string; readonly minor: boolean };
  readonly unit: "kg" | "lb";
  /** Civil day of the athlete's gym (or venue), when this was made. */
  readonly today: string;
  readonly madeAt: string;
  readonly bout: {
    readonly campId: string;
    readonly date: string;
    readonly time: string;
    readonly place: string;
    readonly limitKg: number | null;
  } | null;
  readonly days: readonly AthleteDay[];
  readonly weight: WeightView;
  /** Contact is not planned; only the medic lifts it. */
  readonly hold: { readonly from: string; readonly to: string | null } | null;
}
