import { dayFromIso } from "@/lib/engine/geometry";
import type { SuggestionNumber } from "@/lib/engine/response";
import { dayText } from "@/lib/format/civil";
import { massText, type MassUnit } from "@/lib/format/load";
import type { SuggestionEffect } from "@/lib/schemas/suggestion";

const whole = new Intl.NumberFormat("en-GB", { maximumFractionDigits: 0 });
const fine = new Intl.NumberFormat("en-GB", { maximumFractionDigits: 1 });

/** "2,130 AU", "64.2 kg", "5 of 10", "1.6 %", "×0.8". */
export function numberText({ value, unit }: SuggestionNumber, mass: MassUnit): string {
  if (unit === "kg") return massText(value, mass);
  if (unit === "×") return `× ${value.toFixed(2)}`;
  return `${(unit === "AU" ? whole : fine).format(value)} ${unit}`;
}

const sessions = (count: number): string => (count === 1 ? "1 session" : `${count} sessions`);

/** "Lowers 5 sessions by 15 %: 62 to 53 sets until Sun 12 Dec." */
export function effectText({ over, factor, lifts, setsBefore, setsAfter }: SuggestionEffect): string {
  if (lifts === 0) return "As things stand it changes no session.";
  const percent = Math.round((1 - factor) * 100);
  const sets = `${setsBefore} to ${setsAfter} sets`;
  if (over.kind === "lift")
    return `Sets ${over.title} on ${dayText(dayFromIso(over.date))} to × ${factor.toFixed(2)}: ${sets}.`;
  return `Lowers ${sessions(lifts)} by ${percent} %: ${sets} until ${dayText(dayFromIso(over.to))}.`;
}
