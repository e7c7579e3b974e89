import { z } from "zod";
import type { KnockOn, Plan, SportSession } from "@/lib/engine/types";
import type { Action, Role } from "@/lib/policy";
import {
  athleteFactsSchema,
  boutSchema,
  campWeeks,
  sportEntrySchema,
  weighInSchema,
  type CampBook,
} from "./camp-book";
import type { ChangeKind } from "./change";
import { timeZone } from "./civil";

/** A new camp: for an athlete of the team, or for a new one by name. */
export const campFormSchema = z.object({
  athlete: z.union([
    z.object({ id: z.uuid() }),
    z.object({ name: z.string().trim().min(1, "Give the athlete's name.").max(120) }),
  ]),
  homeZone: timeZone,
  bout: boutSchema,
  weeks: campWeeks,
  weighIn: weighInSchema.nullable(),
  facts: athleteFactsSchema,
  sport: z.array(sportEntrySchema.omit({ id: true, series: true, idShift: true })).max(200),
});
export type CampForm = z.infer<typeof campFormSchema>;

/** The start page's inputs, as its address holds them; kept as a camp after sign-up. */
export const campFromStartSchema = z.object({ camp: z.string().max(4000) });

/** A hold as everyone who may see it sees it: without its reason. */
export interface HoldView {
  readonly from: string;
  readonly to: string | null;
}

/** What the camp page works on. For a guest the numbers of lifting are taken out (`may` lacks `lifts.detail`). */
export interface CampView {
  readonly id: string;
  readonly revision: number;
  readonly changedAt: string;
  readonly athlete: { readonly id: string; readonly name: string };
  readonly book: CampBook;
  readonly plan: Plan;
  /** The sport sessions of the camp, expanded. */
  readonly sport: readonly SportSession[];
  /** Weights of the camp's days, oldest first; empty for a minor and for who may not see them. */
  readonly weights: readonly { readonly date: string; readonly kg: number }[];
  readonly may: readonly Action[];
  /** Roles of the others whom a save may concern; `toldBy` picks those that it does. */
  readonly others: readonly Role[];
}

export interface CampSummary {
  readonly id: string;
  readonly athlete: { readonly id: string; readonly name: string };
  readonly status: CampBook["status"];
  readonly bout: CampBook["bout"];
  readonly weeks: number;
  readonly phases: Plan["phases"];
  readonly onHold: boolean;
  readonly unplaced: number;
  readonly violations: number;
  /** Sessions of the next 14 days, in order. */
  readonly next: readonly {
    readonly id: string;
    readonly date: string;
    readonly start: string;
    readonly source: string;
    readonly kind: string;
    readonly title: string;
  }[];
}

export interface ChangeView {
  readonly number: number;
  readonly by: string;
  readonly at: string;
  readonly summary: string;
  /** Null for the first lay-out and for re-planning after a hold or a house rule. */
  readonly kind: ChangeKind | null;
  readonly knockOn: KnockOn | null;
  readonly putBackOf: number | null;
  readonly putBackBy: number | null;
  readonly canPutBack: boolean;
}

export interface SaveAnswer {
  readonly revision: number;
  readonly view: CampView;
  readonly knockOn: KnockOn;
  readonly told: number;
}
