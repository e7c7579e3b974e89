import { z } from "zod";
import type { KnockOn, Suggestion } from "@/lib/engine";
import type { WaitingRequest } from "./board";

const note = z.string().trim().max(500, "At most 500 characters.");

/** POST /api/camps/:id/suggestions/:key/accept */
export const acceptSuggestionSchema = z.object({
  /** Revision that its effect was shown against; an older one gives 409 with what changed. */
  baseRevision: z.int().min(0),
  idempotencyKey: z.uuid(),
  note,
});
export type AcceptSuggestion = z.infer<typeof acceptSuggestionSchema>;

/** POST /api/camps/:id/suggestions/:key/dismiss */
export const dismissSuggestionSchema = z.object({ reason: note.min(1, "Say why, in a few words.") });
export type DismissSuggestion = z.infer<typeof dismissSuggestionSchema>;

/** What accepting would do, worked out as saving does it. */
export interface SuggestionEffect {
  /** Of one lift, or of all lifting from one day to another, both inclusive. */
  readonly over:
    | { readonly kind: "lift"; readonly title: string; readonly date: string }
    | { readonly kind: "days"; readonly from: string; readonly to: string };
  /** On sets, 0.5 to 1.5. */
  readonly factor: number;
  /** Lifts whose sets or place change. */
  readonly lifts: number;
  /** Sets of those lifts, in all. */
  readonly setsBefore: number;
  readonly setsAfter: number;
  readonly knockOn: KnockOn;
}

/** `effect` is null for a talk, `problem` says why a change cannot be made as things stand. */
export interface SuggestionView extends Pick<
  Suggestion,
  "key" | "kind" | "title" | "numbers" | "text" | "source"
> {
  readonly effect: SuggestionEffect | null;
  readonly problem: string | null;
}

export interface DecisionView {
  readonly key: string;
  readonly decision: "accepted" | "dismissed";
  readonly title: string;
  readonly reason: string;
  /** The change that it made; null where it changed nothing. */
  readonly revision: number | null;
  readonly putBackBy: number | null;
  readonly by: string;
  readonly at: string;
}

/** What of a camp waits for a coach. */
export interface WaitingView {
  readonly revision: number;
  /** Weights stand in it. */
  readonly unit: "kg" | "lb";
  readonly suggestions: readonly SuggestionView[];
  /** Newest first. */
  readonly decisions: readonly DecisionView[];
  readonly requests: readonly WaitingRequest[];
}

export interface AcceptAnswer {
  readonly decision: DecisionView;
  /** Null where nothing was changed: the camp then stands as it did. */
  readonly saved: { readonly revision: number; readonly told: number } | null;
}
