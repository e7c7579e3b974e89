import { AIMS, type Exercise } from "@/lib/engine/prescription/exercise";
import type { ExerciseHistoryEntry } from "@/lib/schemas/exercise";
import {
  AIM_WORDS,
  doseText,
  equipmentText,
  INTENT_WORDS,
  LIMITATION_WORDS,
  LOAD_WORDS,
  ORDER_WORDS,
  qualitiesText,
  restText,
  SIDES_WORDS,
  STRETCH_WORDS,
} from "./words";

type NameOf = (exerciseId: string) => string;

/** Everything that an edit can change, each as one line of text. */
function linesOf(exercise: Exercise, nameOf: NameOf): readonly (readonly [string, string])[] {
  const { doses, sides, bestOf, powerZone, stretch, easier, harder, ruledOutBy } = exercise;
  return [
    ["Name", exercise.name],
    ["Trains", qualitiesText(exercise.qualities)],
    ["Needs", equipmentText(exercise.equipment)],
    ...AIMS.map((aim) => {
      const dose = doses[aim];
      return [AIM_WORDS[aim], dose ? doseText(aim, dose, sides) : "not used"] as const;
    }),
    ["Rest", restText(exercise.rest)],
    ["Load", LOAD_WORDS[exercise.load]],
    ["Whose best", bestOf ? nameOf(bestOf) : "its own"],
    ["Power zone", powerZone ? `${powerZone.low} to ${powerZone.high} %` : "none"],
    ["Moved", INTENT_WORDS[exercise.intent]],
    ["Sides", SIDES_WORDS[sides]],
    ["Place", ORDER_WORDS[exercise.order]],
    ["Main lift", exercise.main ? "yes" : "no"],
    ["Stretch", stretch ? STRETCH_WORDS[stretch] : "none"],
    ["Easier form", easier ? nameOf(easier) : "none"],
    ["Harder form", harder ? nameOf(harder) : "none"],
    ["Ruled out by", ruledOutBy.map((one) => LIMITATION_WORDS[one]).join("; ") || "nothing"],
    ["Cues", exercise.cues.join(" / ")],
  ];
}

/** What one edit did, a line each: "Rest: 60 s, was 90 s". */
export function changeLines({ before, after }: ExerciseHistoryEntry, nameOf: NameOf): string[] {
  if (before === null) return ["Added"];
  if (after === null) return ["Back to the library’s form"];
  const was = new Map(linesOf(before.exercise, nameOf));
  const lines = linesOf(after.exercise, nameOf).flatMap(([name, text]) =>
    text === was.get(name) ? [] : [`${name}: ${text}, was ${was.get(name) ?? "nothing"}`],
  );
  if (before.shelved === after.shelved) return lines;
  return [after.shelved ? "Shelved" : "Brought back", ...lines];
}
