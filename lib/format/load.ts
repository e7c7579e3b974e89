import { KG_PER_LB } from "@/lib/engine/prescription/plates";
import type { Range } from "@/lib/engine/prescription/exercise";
import type { Line } from "@/lib/engine/prescription/types";
import type { ShownLoad } from "@/lib/schemas/prescription";

/** Loads, repetitions and rests as a reader sees them. Kilograms inside, the reader's unit outside. */

export type MassUnit = "kg" | "lb";

/** Kilograms as a number of the unit, to a hundredth. */
export const fromKg = (kg: number, unit: MassUnit): number =>
  Math.round((unit === "lb" ? kg / KG_PER_LB : kg) * 100) / 100;

/** A number of the unit as kilograms. */
export const toKg = (value: number, unit: MassUnit): number => (unit === "lb" ? value * KG_PER_LB : value);

/** A number as people type it, with point or comma; null where it is none. */
export function readNumber(text: string): number | null {
  const value = Number(text.trim().replace(",", "."));
  return text.trim() === "" || !Number.isFinite(value) ? null : value;
}

/** "102.5", without its unit: quarters as they are, anything else to one decimal. */
export function massNumber(kg: number, unit: MassUnit): string {
  const value = fromKg(kg, unit);
  return String(value % 0.25 === 0 ? value : Math.round(value * 10) / 10);
}

/** "102.5 kg", "225 lb". */
export const massText = (kg: number, unit: MassUnit): string => `${massNumber(kg, unit)} ${unit}`;

/** "5", "8 to 10". */
export const spanText = ({ low, high }: Range): string => (low === high ? `${low}` : `${low} to ${high}`);

/** "5", "8 to 10 a side", "20 to 30 s". */
export function repsText({ reps, aim, sides }: Pick<Line, "reps" | "aim" | "sides">): string {
  const count = aim === "hold" ? `${spanText(reps)} s` : spanText(reps);
  return sides === "each" ? `${count} a side` : count;
}

/** "4 × 5", "3 × 8 to 10 a side". */
export const workText = (line: Pick<Line, "sets" | "reps" | "aim" | "sides">): string =>
  `${line.sets} × ${repsText(line)}`;

/** "105 kg", "2 to 3 in reserve", "body mass"; empty where there is nothing to load. */
export function loadText(load: ShownLoad, unit: MassUnit): string {
  switch (load.of) {
    case "best":
      return massText(load.kg, unit);
    case "percent":
      return `${spanText(load.percent)} % of best`;
    case "reserve": {
      const reserve = `${spanText(load.reserve)} in reserve`;
      return load.kg === null ? reserve : `${massText(load.kg, unit)}, ${reserve}`;
    }
    case "body":
      return load.kg === null ? "body mass" : `body mass and ${massText(load.kg, unit)}`;
    case "throw":
      return load.kg === null ? "a ball that still flies fast" : `${massText(load.kg, unit)} ball`;
    case "none":
      return load.kg === null ? "" : massText(load.kg, unit);
  }
}

/** "45 s", "2 min", "1 min 30 s". */
export function restText(seconds: number): string {
  const [minutes, rest] = [Math.floor(seconds / 60), seconds % 60];
  if (minutes === 0) return `${rest} s`;
  return rest === 0 ? `${minutes} min` : `${minutes} min ${rest} s`;
}
