import type { StrikingBase } from "../types";
import type { Aim, Equipment, Exercise, Limitation, Quality } from "./exercise";
import type { RepMaxFormula } from "./types";

export const BASE_WORDS: Readonly<Record<StrikingBase, string>> = {
  "whipping-round-kicks": "whipping round kicks",
  "in-and-out-kicks": "in-and-out kicks",
  "dynamic-high-kicks": "dynamic high kicks",
  boxing: "boxing",
  grappling: "grappling",
};

/** How a best's origin is named beside the figure. */
export const FROM_WORDS: Readonly<Record<"measured" | RepMaxFormula, string>> = {
  measured: "measured",
  epley: "Epley",
  brzycki: "Brzycki",
  lander: "Lander",
  oconner: "O'Conner",
  wathan: "Wathan",
  lombardi: "Lombardi",
  mayhew: "Mayhew",
};

/** "anti-rotation" stays one word; the others read as words. */
export const qualityWords = (quality: Quality): string =>
  quality === "anti-rotation" ? quality : quality.replaceAll("-", " ");

export const thingWords = (thing: Equipment | Limitation): string => thing.replaceAll("-", " ");

export const capital = (text: string): string => text.charAt(0).toUpperCase() + text.slice(1);

/** "a", "a and b", "a, b and c". */
export const listed = (words: readonly string[]): string =>
  words.length < 2 ? words.join("") : `${words.slice(0, -1).join(", ")} and ${words.at(-1) ?? ""}`;

/** At most one decimal. */
export const figure = (value: number): string => String(Math.round(value * 10) / 10);

/** Tempo or intent of a set, in words. Common practice, no published source. */
export function tempoOf(exercise: Pick<Exercise, "intent" | "stretch">, aim: Aim): string {
  if (exercise.stretch === "against-antagonist")
    return "Push against it for a few seconds, let go, go further";
  if (exercise.stretch === "passive") return "Sink into it and breathe out";
  if (exercise.stretch === "active") return "Move to the end of the range and back, under your own power";
  if (aim === "hold" || exercise.intent === "held") return "Hold still and keep breathing";
  if (aim === "fast" || exercise.intent === "explosive") return "As fast as it goes; stop when it slows";
  if (aim === "heavy") return "Down under control, up as fast as it goes";
  return "Down in three, a stop, up in one";
}
