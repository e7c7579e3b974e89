import { dequal } from "dequal";
import type { Base, KnockOn, Lift, Plan } from "@/lib/engine/types";
import type { FieldError } from "@/lib/errors";
import type { CampBook } from "@/lib/schemas/camp-book";
import type { BookEdit } from "./edit";

/** A saved revision, as far as a put-back needs it. */
export interface SavedChange {
  readonly edit: BookEdit;
  readonly inverse: BookEdit;
  readonly knockOn: KnockOn;
  /** Lifts as they stood before it, for those it touched. */
  readonly liftsBefore: readonly Lift[];
}

/** What the revision wrote must still stand; otherwise putting it back would take a later change with it. */
export function putBackProblem(book: CampBook, { edit }: SavedChange): FieldError | null {
  const sport = new Map(book.sport.map((entry) => [entry.id, entry]));
  const responses = new Map(book.responses.map((response) => [response.id, response]));
  const pins = new Map(book.pins.map((pin) => [pin.liftId, pin]));
  const stands =
    (edit.putSport ?? []).every((entry) => dequal(sport.get(entry.id), entry)) &&
    (edit.dropSport ?? []).every((id) => !sport.has(id)) &&
    (edit.putPins ?? []).every((pin) => dequal(pins.get(pin.liftId), pin)) &&
    (edit.dropPins ?? []).every((id) => !pins.has(id)) &&
    (edit.putResponses ?? []).every((response) => dequal(responses.get(response.id), response)) &&
    (edit.dropResponses ?? []).every((id) => !responses.has(id)) &&
    (edit.bout === undefined || dequal(edit.bout, book.bout)) &&
    (edit.weeks === undefined || edit.weeks === book.weeks) &&
    (edit.weighIn === undefined || dequal(edit.weighIn, book.weighIn)) &&
    (edit.status === undefined || edit.status === book.status) &&
    Object.entries(edit.factors ?? {}).every(([id, factor]) => (book.coachFactors[id] ?? null) === factor);
  return stands
    ? null
    : {
        pointer: "/change/revision",
        message: "A later change touched the same sessions: put that one back first.",
      };
}

/**
 * The plan that a put-back is measured against: the standing one, with every lift that this revision moved, and that has
 * not moved since, back where it stood. So sessions return to their old places instead of staying put in the new ones.
 */
export function putBackBase(standing: Plan, saved: SavedChange): Base {
  const before = new Map(saved.liftsBefore.map((lift) => [lift.id, lift]));
  const effects = new Map(saved.knockOn.lifts.map((effect) => [effect.id, effect]));
  const stands = (lift: Lift): boolean => {
    const to = effects.get(lift.id)?.to;
    return to !== null && to !== undefined && to.day === lift.day && to.start === lift.start;
  };
  const kept = standing.lifts.flatMap((lift): Lift[] => {
    if (lift.past || !effects.has(lift.id) || !stands(lift)) return [lift];
    const old = before.get(lift.id);
    return old ? [old] : [];
  });
  const present = new Set(kept.map((lift) => lift.id));
  const standingIds = new Set(standing.lifts.map((lift) => lift.id));
  const returned = saved.liftsBefore.filter(
    (lift) => !present.has(lift.id) && !standingIds.has(lift.id) && effects.get(lift.id)?.to === null,
  );
  // The bout's own day decides how slots are matched to lifts: where the revision moved it, the old day matches again.
  const boutDay = saved.knockOn.bout?.from.day ?? standing.bout.day;
  return { boutDay, lifts: [...kept, ...returned] };
}
