import { formatInstant } from "@/lib/format/dates";
import type { DecisionView } from "@/lib/schemas/suggestion";

/** What was decided before, newest first. */
export function DecisionList({
  decisions,
  zone,
}: {
  readonly decisions: readonly DecisionView[];
  readonly zone: string;
}) {
  if (decisions.length === 0) return null;
  return (
    <details className="border-t border-line px-4 py-2.5 text-sm">
      <summary className="font-semibold">Decided before</summary>
      <ul className="mt-1.5 grid gap-1.5">
        {decisions.map(({ key, decision, title, reason, revision, putBackBy, by, at }) => (
          <li key={key}>
            <b className="font-semibold">{title}</b>: {decision} by {by}, {formatInstant(new Date(at), zone)}.
            {reason ? ` “${reason}”` : ""}
            {revision === null ? "" : ` Change ${revision}.`}
            {putBackBy === null ? "" : ` Put back by change ${putBackBy}.`}
          </li>
        ))}
      </ul>
    </details>
  );
}
