import { checkInSuggestions } from "./check-in";
import { effortSuggestions, missedSuggestions, painSuggestions } from "./logs";
import { SUGGESTION_KINDS, type ResponseInput, type Suggestion, type SuggestionKind } from "./types";
import { weekLoadSuggestions } from "./week-load";
import { weightSuggestions } from "./weight";

const MAKERS: Readonly<Record<SuggestionKind, (input: ResponseInput) => readonly Suggestion[]>> = {
  pain: painSuggestions,
  weight: weightSuggestions,
  "check-in": checkInSuggestions,
  effort: effortSuggestions,
  "week-load": weekLoadSuggestions,
  missed: missedSuggestions,
};

/**
 * What the answers of an athlete ask of the coach, in the order of `SUGGESTION_KINDS`. Same input, same suggestions, in
 * whatever order the lists come; nothing is changed by making one.
 */
export const suggestions = (input: ResponseInput): readonly Suggestion[] =>
  SUGGESTION_KINDS.flatMap((kind) => MAKERS[kind](input));
