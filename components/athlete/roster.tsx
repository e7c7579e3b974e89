import Link from "next/link";
import { AGE_WORDS, BASE_WORDS } from "@/components/start/words";
import { EmptyState } from "@/components/ui/empty-state";
import { Cell, HeadCell, Table } from "@/components/ui/table";
import type { AthleteSummary } from "@/lib/schemas/athlete";

interface RosterProps {
  readonly athletes: readonly AthleteSummary[];
  readonly adds: boolean;
}

const remarks = ({ onHold, minor }: AthleteSummary): string =>
  [onHold ? "On a hold" : null, minor ? "Under 18" : null].filter(Boolean).join(", ");

/** The team's athletes. */
export function Roster({ athletes, adds }: RosterProps) {
  if (athletes.length === 0) {
    return (
      <EmptyState title="Nobody on the roster yet">
        {adds
          ? "Add an athlete, or set a bout: a new name there comes onto the roster by itself."
          : "A coach adds athletes, or sets a bout for a new one."}
      </EmptyState>
    );
  }
  return (
    <Table caption="Athletes">
      <thead>
        <tr>
          <HeadCell>Name</HeadCell>
          <HeadCell>Sport</HeadCell>
          <HeadCell>Striking base</HeadCell>
          <HeadCell>Training age</HeadCell>
          <HeadCell>Lifts a week</HeadCell>
          <HeadCell>Remarks</HeadCell>
        </tr>
      </thead>
      <tbody>
        {athletes.map((athlete) => (
          <tr key={athlete.id}>
            <HeadCell scope="row">
              <Link
                href={`/athletes/${athlete.id}`}
                className="inline-flex min-h-control-small items-center underline"
              >
                {athlete.name}
              </Link>
            </HeadCell>
            <Cell>{athlete.sport}</Cell>
            <Cell>{BASE_WORDS[athlete.facts.strikingBase]}</Cell>
            <Cell>{AGE_WORDS[athlete.facts.trainingAge]}</Cell>
            <Cell>{athlete.facts.liftsPerWeek}</Cell>
            <Cell>{remarks(athlete)}</Cell>
          </tr>
        ))}
      </tbody>
    </Table>
  );
}
