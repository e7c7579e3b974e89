import type { Choice } from "@/components/ui/select";
import type { StrikingBase, TrainingAge, Weekday } from "@/lib/engine/types";
import { HARD_UNTIL_DAYS, type WeighInDay } from "@/lib/schemas/start-params";

export const BASE_WORDS: Record<StrikingBase, string> = {
  "whipping-round-kicks": "Whipping round kicks",
  "in-and-out-kicks": "In-and-out kicks",
  "dynamic-high-kicks": "Dynamic high kicks",
  boxing: "Boxing",
  grappling: "Grappling",
};

export const AGE_WORDS: Record<TrainingAge, string> = {
  novice: "Novice",
  intermediate: "Intermediate",
  advanced: "Advanced",
};

const WEIGH_IN_WORDS: Record<WeighInDay, string> = {
  unknown: "Not known yet",
  "day-before": "The day before",
  "same-day": "The same day",
};

const choicesOf = <T extends string>(words: Record<T, string>): Choice[] =>
  Object.entries<string>(words).map(([value, label]) => ({ value, label }));

export const BASE_CHOICES = choicesOf(BASE_WORDS);
export const AGE_CHOICES = choicesOf(AGE_WORDS);
export const WEIGH_IN_CHOICES = choicesOf(WEIGH_IN_WORDS);

const upTo = (from: number, to: number, label: (n: number) => string): Choice<number>[] =>
  Array.from({ length: to - from + 1 }, (_, index) => ({ value: from + index, label: label(from + index) }));

export const WEEK_CHOICES = upTo(1, 20, (n) => (n === 1 ? "1 week" : `${n} weeks`));
export const LIFT_CHOICES = upTo(1, 4, String);
export const OTHER_CHOICES = upTo(0, 7, (n) => (n === 0 ? "None" : String(n)));
export const UNTIL_CHOICES = HARD_UNTIL_DAYS.map((n) => ({
  value: n,
  label: n === 0 ? "Up to the bout" : `${n} days out`,
}));

export const WEEKDAY_TOGGLES: readonly { value: Weekday; label: string; spoken: string }[] = [
  { value: 1, label: "Mon", spoken: "Monday" },
  { value: 2, label: "Tue", spoken: "Tuesday" },
  { value: 3, label: "Wed", spoken: "Wednesday" },
  { value: 4, label: "Thu", spoken: "Thursday" },
  { value: 5, label: "Fri", spoken: "Friday" },
  { value: 6, label: "Sat", spoken: "Saturday" },
  { value: 7, label: "Sun", spoken: "Sunday" },
];
