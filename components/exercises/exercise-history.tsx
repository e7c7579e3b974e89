import { dateText } from "@/components/athlete/words";
import type { ExerciseHistoryEntry, ExerciseSummary } from "@/lib/schemas/exercise";
import { changeLines } from "./history-words";

interface ExerciseHistoryProps {
  readonly history: readonly ExerciseHistoryEntry[];
  readonly exercises: readonly ExerciseSummary[];
}

/** Who changed what, newest first. */
export function ExerciseHistory({ history, exercises }: ExerciseHistoryProps) {
  const nameOf = (id: string): string =>
    exercises.find(({ exercise }) => exercise.id === id)?.exercise.name ?? id;
  return (
    <>
      <h3 className="mt-4 border-t border-line-soft pt-4 text-sm font-semibold">What the team changed</h3>
      {history.length === 0 ? <p className="mt-1 text-sm text-ink-2">Nothing yet.</p> : null}
      <ol>
        {history.map((entry) => (
          <li key={entry.id} className="border-t border-line-soft py-2 text-sm first:border-0">
            <p className="text-ink-2">
              <time dateTime={entry.at}>{dateText(entry.at)}</time>
              {entry.by ? `, ${entry.by}` : ", somebody who is no longer here"}
            </p>
            <ul>
              {changeLines(entry, nameOf).map((line) => (
                <li key={line} className="break-words">
                  {line}
                </li>
              ))}
            </ul>
          </li>
        ))}
      </ol>
    </>
  );
}
