import { Panel } from "@/components/ui/panel";
import type { AthleteView, LimitationsSince } from "@/lib/schemas/athlete";
import { codesText, dateText } from "./words";

const textOf = ({ limitations, limitationCodes }: LimitationsSince): string =>
  [codesText(limitationCodes), limitations].filter(Boolean).join("\n") || "None";

/** What an athlete's limitations were, and since when. */
export function LimitationsPanel({ athlete }: { readonly athlete: AthleteView }) {
  return (
    <Panel title="Limitations so far">
      {athlete.limitationHistory.length === 0 ? (
        <p className="py-1 text-ink-2">They were never changed.</p>
      ) : (
        <ol className="divide-y divide-line-soft">
          {athlete.limitationHistory.map((entry) => (
            <li key={entry.id} className="py-2.5">
              <p className="text-sm text-ink-2">
                Since <time dateTime={entry.since}>{dateText(entry.since)}</time>
                {entry.by ? `, by ${entry.by}` : ""}
              </p>
              <p className="break-words whitespace-pre-line">{textOf(entry)}</p>
            </li>
          ))}
        </ol>
      )}
    </Panel>
  );
}
