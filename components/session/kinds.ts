import type { Item, Phase, SportKind } from "@/lib/engine/types";

/** The shapes that tell kinds of work apart without colour; `kind-mark.tsx` draws them. */
export type Mark =
  | "square"
  | "triangle"
  | "diamond"
  | "two-dots"
  | "ring"
  | "dot"
  | "bar"
  | "arrow"
  | "pause"
  | "frame"
  | "scale";

/** How one kind of work looks wherever it is shown. */
export interface WorkLook {
  readonly label: string;
  readonly mark: Mark;
  /** Classes of its chip: ground, text and border. */
  readonly chip: string;
  /** Class that fills a bar or a gutter with its colour: at least 3:1 against paper. */
  readonly bar: string;
  /** Class that gives an SVG shape the same colour. */
  readonly fill: string;
  /** Class for its mark standing alone on paper. */
  readonly text: string;
}

type Colours = Omit<WorkLook, "label" | "mark">;

const HARD: Colours = {
  chip: "bg-red-fill text-red-on border-red-fill",
  bar: "bg-red",
  fill: "fill-red",
  text: "text-red",
};
const RED_LINE: Colours = { ...HARD, chip: "bg-paper text-red-text border-red" };
const PLAIN: Colours = {
  chip: "bg-paper text-ink-2 border-line",
  bar: "bg-ink-3",
  fill: "fill-ink-3",
  text: "text-ink-3",
};
const BLUE: Colours = {
  chip: "bg-blue-tint text-blue-text border-blue-tint",
  bar: "bg-blue",
  fill: "fill-blue",
  text: "text-blue",
};
const IRON: Colours = {
  chip: "bg-iron-fill text-iron-on border-iron-fill",
  bar: "bg-iron",
  fill: "fill-iron",
  text: "text-iron",
};
const BRASS: Colours = {
  chip: "bg-brass-tint text-brass-text border-brass-edge",
  bar: "bg-brass",
  fill: "fill-brass",
  text: "text-brass",
};
const GAUZE: Colours = {
  chip: "bg-gauze-tint text-gauze-text border-gauze-edge",
  bar: "bg-gauze",
  fill: "fill-gauze",
  text: "text-gauze",
};

export const SPORT_LOOKS: Record<SportKind, WorkLook> = {
  "hard-sparring": { label: "Hard sparring", mark: "two-dots", ...HARD },
  "technical-sparring": { label: "Technical sparring", mark: "ring", ...RED_LINE },
  skill: { label: "Skill", mark: "dot", ...PLAIN },
  conditioning: { label: "Conditioning", mark: "bar", ...BLUE },
  travel: { label: "Travel", mark: "arrow", ...PLAIN },
  rest: { label: "Rest", mark: "pause", ...PLAIN },
  other: { label: "Other", mark: "frame", ...PLAIN },
};

export const WEIGH_IN_LOOK: WorkLook = { label: "Weigh-in", mark: "scale", ...BLUE };

const STRENGTH = { mark: "square", ...IRON } as const;
const POWER = { mark: "triangle", ...BRASS } as const;
const TAPER = { mark: "diamond", ...GAUZE } as const;

export const ITEM_LOOKS: Record<Item, WorkLook> = {
  "strength-a": { label: "Strength A", ...STRENGTH },
  "strength-b": { label: "Strength B", ...STRENGTH },
  "trunk-and-kick": { label: "Trunk and kick", ...POWER },
  "power-touch": { label: "Power touch", ...POWER },
  "power-a": { label: "Power A", ...POWER },
  "strength-keep": { label: "Strength keep", ...STRENGTH },
  "power-b": { label: "Power B", ...POWER },
  "power-short": { label: "Power, short", ...TAPER },
  primer: { label: "Primer", ...TAPER },
};

/** A lift's look: whatever is lifted in the taper looks like taper, since its volume is what falls. */
export function liftLook(item: Item, phase: Phase): WorkLook {
  return phase === "taper" ? { ...TAPER, label: ITEM_LOOKS[item].label } : ITEM_LOOKS[item];
}

export interface PhaseLook {
  readonly label: string;
  readonly bar: string;
  readonly fill: string;
}

export const PHASE_LOOKS: Record<Phase, PhaseLook> = {
  foundation: { label: "Foundation", bar: "bg-ink-3", fill: "fill-ink-3" },
  strength: { label: "Strength", bar: IRON.bar, fill: IRON.fill },
  power: { label: "Power", bar: BRASS.bar, fill: BRASS.fill },
  taper: { label: "Taper", bar: GAUZE.bar, fill: GAUZE.fill },
};

/** The gutter of a camp week: its phase, or red for fight week. */
export function weekLook(phase: Phase, weeksOut: number, deload: boolean): PhaseLook {
  const look = PHASE_LOOKS[phase];
  if (weeksOut === 0) return { label: look.label, bar: HARD.bar, fill: HARD.fill };
  return deload ? { ...look, label: `${look.label}, light` } : look;
}

/** "7 wk out", and "Fight week" for the last. */
export const weekTitle = (weeksOut: number): string => (weeksOut === 0 ? "Fight week" : `${weeksOut} wk out`);
