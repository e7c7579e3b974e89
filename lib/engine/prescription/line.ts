import type { Lift, Reason } from "../types";
import { baseFor } from "./base-weights";
import type { Candidate } from "./choose";
import type { Aim, BaseMix, Exercise, Range } from "./exercise";
import { GOALS } from "./loading-tables";
import { bestOn, heavyRow, loadOf, repsOf } from "./loads";
import { KG_PER_LB } from "./plates";
import type { Slot } from "./slots";
import type { Best, Line, LineEdit, LineLoad, Plates } from "./types";
import { BASE_WORDS, capital, figure, FROM_WORDS, qualityWords, tempoOf } from "./wording";

/** A slot with what fills it. */
export interface Filled {
  readonly slot: Pick<Slot, "id" | "purpose" | "work"> & Partial<Slot>;
  readonly exercise: Exercise;
  readonly aim: Aim;
  /** Tier of the slot; 0 for what the coach chose. */
  readonly tier: Candidate["tier"];
  /** Who or what chose it, where it was not the turn. */
  readonly reasons: readonly Reason[];
  readonly chosenByCoach: boolean;
}

/** What all lines of a plan share. */
export interface LineContext {
  readonly mix: BaseMix;
  readonly bests: readonly Best[];
  readonly plates: Plates;
}

/** Rest between heavy sets: strength in the goal table. */
const HEAVY_REST: Range = GOALS.strength.rest;

const clamp = (value: number, { low, high }: Range): number => Math.min(high, Math.max(low, value));

const said = (kg: number, { unit }: Plates): string =>
  unit === "lb" ? `${figure(kg / KG_PER_LB)} lb` : `${figure(kg)} kg`;

const span = ({ low, high }: Range): string =>
  low === high ? figure(low) : `${figure(low)} to ${figure(high)}`;

function choiceReasons(
  { slot, exercise, aim, tier, reasons, chosenByCoach }: Filled,
  mix: BaseMix,
): Reason[] {
  if (chosenByCoach) return [...reasons];
  const list = [...reasons];
  const quality = exercise.qualities[0];
  const base = slot.byBase ? baseFor(quality, mix) : null;
  if (base) list.push({ rule: "base", text: `${capital(qualityWords(quality))} for ${BASE_WORDS[base]}.` });
  if (slot.work === "heavy" && (tier > 0 || aim !== "heavy")) {
    list.push({
      rule: "no-main",
      text: "No heavy main lift fits the equipment and the limitations; this comes nearest.",
    });
  } else if (slot.stays) {
    list.push({ rule: "block", text: "Stays for this block of weeks, so that it can grow." });
  }
  return list;
}

function loadReason(
  load: LineLoad,
  exercise: Exercise,
  known: Best | null,
  { plates }: LineContext,
): Reason[] {
  if (exercise.load === "best" && !known) {
    return [{ rule: "no-best", text: "No best of this lift is known yet, so no kilograms are said." }];
  }
  if (load.of !== "best") return [];
  const { best, percent, kg } = load;
  const [low, high] = [(best.kg * percent.low) / 100, (best.kg * percent.high) / 100];
  const range = `${said(low, plates)} to ${said(high, plates)}`;
  return [
    {
      rule: "percent",
      text: `${span(percent)} % of ${said(best.kg, plates)} (${FROM_WORDS[best.from]}) is ${range}; ${said(kg, plates)} on the plates.`,
    },
  ];
}

function doseReasons(lift: Lift, aim: Aim, sets: number, reps: Range): Reason[] {
  const list: Reason[] = [{ rule: "sets", text: `${sets} of the session's ${lift.sets} sets.` }];
  const row = aim === "heavy" ? heavyRow(lift.intensity) : null;
  if (row) {
    const { low, high } = row.total;
    list.push({
      rule: "lift-count",
      text: `${sets} × ${reps.high} is ${sets * reps.high} lifts; the table gives ${low} to ${high}, ${row.optimal} best.`,
    });
  }
  if (lift.phase === "taper" && aim === "heavy") {
    list.push({ rule: "taper", text: "The load stays through the taper; only the sets fall." });
  }
  return list;
}

/** A load with the coach's kilograms; of a best, the percent they are. */
function withKg(load: LineLoad, given: number): LineLoad {
  const kg = given as Best["kg"];
  if (load.of !== "best") return { ...load, kg };
  const percent = Math.round((200 * given) / load.best.kg) / 2;
  return { ...load, kg, percent: { low: percent, high: percent } };
}

/** One line: what fills the slot, `sets` of it, and what the coach wrote over it. Alternatives are added by the session. */
export function lineOf(
  filled: Filled,
  lift: Lift,
  sets: number,
  edit: LineEdit | undefined,
  context: LineContext,
): Line {
  const { slot, exercise, aim } = filled;
  const warmUp = slot.work === "warm-up";
  const reps = repsOf(exercise, aim, sets, lift.intensity, lift.item === "primer");
  const best = bestOn(context.bests, exercise, lift.day);
  const load = loadOf({
    exercise,
    aim,
    reps: edit?.reps ?? reps,
    intensity: lift.intensity,
    best,
    plates: context.plates,
  });
  const edited: (keyof LineEdit)[] = [];
  if (filled.chosenByCoach) edited.push("exercise");
  if (edit?.sets !== undefined) edited.push("sets");
  if (edit?.reps !== undefined) edited.push("reps");
  if (edit?.kg !== undefined) edited.push("kg");
  if (edit?.note !== undefined) edited.push("note");
  const dosed = edit?.sets === undefined && edit?.reps === undefined && !warmUp;
  return {
    slot: slot.id,
    purpose: slot.purpose,
    exercise: exercise.id,
    name: exercise.name,
    aim,
    sets: edit?.sets ?? sets,
    reps: edit?.reps ?? reps,
    sides: exercise.sides,
    intent: exercise.intent,
    tempo: tempoOf(exercise, aim),
    load: edit?.kg === undefined ? load : withKg(load, edit.kg),
    rest: aim === "heavy" ? clamp(exercise.rest, HEAVY_REST) : exercise.rest,
    cues: exercise.cues,
    reasons: [
      ...choiceReasons(filled, context.mix),
      ...(dosed ? doseReasons(lift, aim, sets, reps) : []),
      ...(edit?.kg === undefined ? loadReason(load, exercise, best, context) : []),
    ],
    edited,
    note: edit?.note ?? null,
    alternatives: [],
  };
}
