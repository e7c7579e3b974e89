import Link from "next/link";
import type { ReactNode } from "react";
import { AIMS, type Exercise } from "@/lib/engine/prescription/exercise";
import type { ExerciseSummary } from "@/lib/schemas/exercise";
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

interface ExerciseFactsProps {
  readonly exercise: Exercise;
  /** All of the team's, for the names of easier and harder forms. */
  readonly exercises: readonly ExerciseSummary[];
  /** Filters of the list, which links keep. */
  readonly query: string;
}

function Other({ id, exercises, query }: { id: string } & Omit<ExerciseFactsProps, "exercise">) {
  const other = exercises.find(({ exercise }) => exercise.id === id);
  if (!other) return id;
  const address = `/exercises/${encodeURIComponent(id)}`;
  return (
    <Link href={query === "" ? address : `${address}?${query}`} className="underline">
      {other.exercise.name}
    </Link>
  );
}

function loadText({ load, powerZone }: Exercise): string {
  return powerZone
    ? `${LOAD_WORDS[load]}; most power at ${powerZone.low} to ${powerZone.high} % (Soriano et al. 2015)`
    : LOAD_WORDS[load];
}

/** What an exercise is: cues first, then everything a session is filled by. */
export function ExerciseFacts({ exercise, exercises, query }: ExerciseFactsProps) {
  const { doses, sides, bestOf, stretch, ruledOutBy, easier, harder } = exercise;
  const other = (id: string | null): ReactNode =>
    id === null ? "None" : <Other id={id} exercises={exercises} query={query} />;
  const facts: readonly (readonly [string, ReactNode])[] = [
    ["Trains", qualitiesText(exercise.qualities)],
    ["Needs", equipmentText(exercise.equipment)],
    ...AIMS.flatMap((aim) => {
      const dose = doses[aim];
      return dose ? [[AIM_WORDS[aim], doseText(aim, dose, sides)] as const] : [];
    }),
    ["Rest between sets", restText(exercise.rest)],
    ["Load", loadText(exercise)],
    ...(bestOf ? [["Whose best", other(bestOf)] as const] : []),
    ["Moved", INTENT_WORDS[exercise.intent]],
    ["Sides", SIDES_WORDS[sides]],
    ["Place", `${ORDER_WORDS[exercise.order]}${exercise.main ? "; may be a main lift" : ""}`],
    ...(stretch ? [["Stretch", STRETCH_WORDS[stretch]] as const] : []),
    ["Easier form", other(easier)],
    ["Harder form", other(harder)],
    [
      "Ruled out by",
      ruledOutBy.length === 0 ? "Nothing" : ruledOutBy.map((one) => LIMITATION_WORDS[one]).join("; "),
    ],
  ];
  return (
    <>
      <h3 className="mt-3 text-sm font-semibold">Cues</h3>
      <ol className="mt-1 list-decimal pl-5">
        {exercise.cues.map((cue) => (
          <li key={cue} className="break-words">
            {cue}
          </li>
        ))}
      </ol>
      <dl className="mt-3">
        {facts.map(([name, value]) => (
          <div
            key={name}
            className="grid grid-cols-[9rem_minmax(0,1fr)] gap-x-4 border-t border-line-soft py-1.5 text-sm"
          >
            <dt className="font-semibold">{name}</dt>
            <dd className="break-words">{value}</dd>
          </div>
        ))}
      </dl>
    </>
  );
}
