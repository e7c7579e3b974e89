import type { Item } from "../types";
import { weightsOf, type Weights } from "./base-weights";
import { candidatesOf, isAllowed, slotTurns, type Candidate } from "./choose";
import { emptySlot, type Bounds } from "./empty";
import type { Exercise, Quality } from "./exercise";
import type { LineContext } from "./line";
import type { Slot } from "./slots";
import type { EmptySlot, PrescriptionInput } from "./types";

interface Ranked {
  readonly candidates: readonly Candidate[];
  readonly turns: readonly Quality[];
}

/** What one athlete may do, looked up once for all sessions of a plan. */
export interface Library extends Bounds, LineContext {
  readonly exercises: readonly Exercise[];
  readonly byId: ReadonlyMap<string, Exercise>;
  readonly mobility: readonly Exercise[];
  readonly weights: Weights;
  readonly edits: PrescriptionInput["edits"];
  /** Candidates of a slot, best first. */
  ranked(item: Item, slot: Slot, early: boolean): Ranked;
  /** A slot that nothing fills, with the reason. */
  emptyOf(slot: Slot): EmptySlot;
  /** What the camp's swaps make of an exercise; null where none does, or where it may not be done. */
  swapFor(item: Item, from: Exercise): Exercise | null;
}

export function libraryOf(input: PrescriptionInput): Library {
  const { exercises, mix, bests, plates, edits, swaps } = input;
  const equipment = new Set(input.equipment);
  const limitations = new Set(input.limitations);
  const allowed = exercises.filter((exercise) => isAllowed(exercise, equipment, limitations));
  const allowedIds = new Set(allowed.map(({ id }) => id));
  const byQuality = new Map<Quality, Exercise[]>();
  for (const exercise of allowed) {
    const rows = byQuality.get(exercise.qualities[0]);
    if (rows) rows.push(exercise);
    else byQuality.set(exercise.qualities[0], [exercise]);
  }
  const byId = new Map(exercises.map((exercise) => [exercise.id, exercise]));
  const weights = weightsOf(mix);
  const bounds = { equipment, limitations };
  const cache = new Map<string, Ranked>();
  const empty = new Map<Slot, EmptySlot>();
  return {
    ...bounds,
    mix,
    bests,
    plates,
    edits,
    exercises,
    byId,
    mobility: [...(byQuality.get("mobility") ?? [])].sort((a, b) => (a.id < b.id ? -1 : 1)),
    weights,
    ranked(item, slot, early) {
      const key = `${item} ${slot.id} ${String(early)}`;
      let ranked = cache.get(key);
      if (!ranked) {
        const candidates = candidatesOf(slot, byQuality, weights, early);
        ranked = { candidates, turns: slotTurns(slot, weights) };
        cache.set(key, ranked);
      }
      return ranked;
    },
    emptyOf(slot) {
      const known = empty.get(slot) ?? emptySlot(slot, exercises, bounds);
      empty.set(slot, known);
      return known;
    },
    swapFor(item, from) {
      // In the order they were made: a swap of a swap goes on, a swap back comes home.
      let id = from.id;
      for (const swap of swaps) if (swap.item === item && swap.from === id) id = swap.to;
      return id !== from.id && allowedIds.has(id) ? (byId.get(id) ?? null) : null;
    },
  };
}
