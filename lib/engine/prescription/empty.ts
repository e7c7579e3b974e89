import { fitOf } from "./choose";
import type { Equipment, Exercise, Limitation } from "./exercise";
import type { Slot } from "./slots";
import type { EmptySlot } from "./types";
import { listed, thingWords } from "./wording";

/** What an athlete has and must leave out. */
export interface Bounds {
  readonly equipment: ReadonlySet<Equipment>;
  readonly limitations: ReadonlySet<Limitation>;
}

/** Why an exercise may not be done: what is missing, then what rules it out. Empty where it may. */
export function whyNot(exercise: Exercise, { equipment, limitations }: Bounds): string {
  const missing = exercise.equipment.filter((thing) => !equipment.has(thing));
  const against = exercise.ruledOutBy.filter((limitation) => limitations.has(limitation));
  const parts = [
    missing.length > 0 ? `there is no ${listed(missing.map(thingWords))}` : "",
    against.length > 0 ? `the athlete's limitation rules it out: ${listed(against.map(thingWords))}` : "",
  ];
  return parts.filter((part) => part !== "").join("; ");
}

/** A slot that stays empty, with the numbers of what would have fitted. */
export function emptySlot(slot: Slot, exercises: readonly Exercise[], bounds: Bounds): EmptySlot {
  const fitting = exercises.filter((exercise) => fitOf(slot, exercise) !== null);
  const without = fitting.filter(({ equipment }) => equipment.some((thing) => !bounds.equipment.has(thing)));
  const against = fitting.filter(({ ruledOutBy }) => ruledOutBy.some((one) => bounds.limitations.has(one)));
  const places = [...bounds.limitations].filter((one) =>
    against.some(({ ruledOutBy }) => ruledOutBy.includes(one)),
  );
  const parts = [
    without.length > 0 ? `${without.length} need equipment that is not there` : "",
    against.length > 0 ? `${against.length} are ruled out (${listed(places.map(thingWords))})` : "",
  ].filter((part) => part !== "");
  const why =
    fitting.length === 0
      ? "No exercise of the library fits."
      : parts.length === 0
        ? "All that fit are already in this session."
        : `Of ${fitting.length} that would fit, ${listed(parts)}; none is left.`;
  return { slot: slot.id, purpose: slot.purpose, why };
}
