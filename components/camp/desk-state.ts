import type { Day, Minute } from "@/lib/engine/types";
import type { MissedChange } from "@/lib/query/camps";
import type { Change } from "@/lib/schemas/change";

/** A change that the browser can preview by itself; putting back needs the saved history. */
export type LiveChange = Exclude<Change, { kind: "put-back" }>;

/** What a person is trying out: one change, not saved. `key` makes saving it twice harmless. */
export interface Pending {
  readonly change: LiveChange;
  readonly key: string;
}

interface Place {
  readonly day: Day;
  readonly start: Minute;
}

/** A session that is being moved right now. */
export interface Hand {
  readonly by: "pointer" | "keys";
  readonly id: string;
  /** Where it was picked up. */
  readonly from: Place;
  /** Where it is over. */
  readonly at: Place;
  /** What was being tried out when it was picked up: letting go of it brings that back. */
  readonly before: Pending | null;
}

export interface DeskState {
  readonly pending: Pending | null;
  readonly hand: Hand | null;
  /** Id of the session whose details are open. */
  readonly selected: string | null;
  /** On its way to the server. */
  readonly saving: Pending | null;
  /** Why the last save did not go through. */
  readonly refusal: string | null;
  /** Newest revision that the person at this page has been told of. */
  readonly seen: number;
  /** What others saved while a change was being tried out here. */
  readonly missed: readonly MissedChange[];
}

export type DeskStep =
  | { readonly type: "try"; readonly change: LiveChange; readonly key: string }
  | { readonly type: "hold"; readonly hand: Hand; readonly change: LiveChange | null; readonly key: string }
  | { readonly type: "drop" }
  | { readonly type: "let-go" }
  | { readonly type: "clear" }
  | { readonly type: "select"; readonly id: string | null }
  | { readonly type: "saving" }
  | { readonly type: "saved"; readonly revision: number }
  | {
      readonly type: "refused";
      readonly refusal: string | null;
      readonly missed: readonly MissedChange[];
      readonly seen: number;
    }
  | { readonly type: "news"; readonly missed: readonly MissedChange[]; readonly seen: number };

export const emptyDesk = (revision: number, selected: string | null): DeskState => ({
  pending: null,
  hand: null,
  selected,
  saving: null,
  refusal: null,
  seen: revision,
  missed: [],
});

const newer = (missed: readonly MissedChange[], known: readonly MissedChange[]): MissedChange[] => {
  const numbers = new Set(known.map((change) => change.number));
  return [...known, ...missed.filter((change) => !numbers.has(change.number))];
};

/** One step at the desk. A new change takes the place of the one tried before: changes are not stacked. */
export function deskStep(state: DeskState, step: DeskStep): DeskState {
  switch (step.type) {
    case "try":
      return { ...state, pending: { change: step.change, key: step.key }, hand: null, refusal: null };
    case "hold":
      return {
        ...state,
        hand: step.hand,
        pending: step.change ? { change: step.change, key: step.key } : step.hand.before,
        refusal: null,
      };
    case "drop":
      return { ...state, hand: null };
    case "let-go":
      return { ...state, hand: null, pending: state.hand ? state.hand.before : state.pending };
    case "clear":
      return { ...state, pending: null, hand: null, refusal: null, missed: [] };
    case "select":
      return { ...state, selected: step.id };
    case "saving":
      return { ...state, saving: state.pending, pending: null, hand: null, refusal: null };
    case "saved":
      return { ...state, saving: null, missed: [], seen: Math.max(state.seen, step.revision) };
    case "refused":
      return {
        ...state,
        // A change that was started meanwhile stays; the refused one is then only told of.
        pending: state.pending ?? state.saving,
        saving: null,
        refusal: step.refusal,
        missed: newer(step.missed, state.missed),
        seen: Math.max(state.seen, step.seen),
      };
    case "news":
      return {
        ...state,
        missed: state.pending ? newer(step.missed, state.missed) : [],
        seen: Math.max(state.seen, step.seen),
      };
  }
}
