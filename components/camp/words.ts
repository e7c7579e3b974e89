import type { KnockOn } from "@/lib/engine/types";
import { momentText } from "@/lib/format/civil";
import type { Place } from "./move-change";

const NUMBERS = [
  "No",
  "One",
  "Two",
  "Three",
  "Four",
  "Five",
  "Six",
  "Seven",
  "Eight",
  "Nine",
  "Ten",
  "Eleven",
  "Twelve",
];

/** "Four sessions", "One session", "17 sessions". */
const countText = (count: number, noun: string): string =>
  `${NUMBERS[count] ?? count} ${noun}${count === 1 ? "" : "s"}`;

/** What the page says when the server has saved. */
export function toldText(people: number, act = "Saved"): string {
  if (people === 0) return `${act}. Nobody else had to be told.`;
  return `${act}. ${people === 1 ? "1 person is" : `${people} people are`} being told.`;
}

/** How many sessions respond, besides the one that is being changed. */
export function respondText(knockOn: KnockOn, subject: string | null): string {
  const lifts = knockOn.lifts.filter((effect) => effect.id !== subject).length;
  if (lifts === 0) return "Nothing else in the camp changes.";
  return `${countText(lifts, "session")} ${lifts === 1 ? "responds" : "respond"}; the rest of the camp stays as it is.`;
}

/** What a screen reader hears while a session is carried. */
export function carriedText(title: string, at: Place, knockOn: KnockOn | null, subject: string): string {
  const where = `${title}, ${momentText(at)}.`;
  return knockOn ? `${where} ${respondText(knockOn, subject)}` : where;
}
