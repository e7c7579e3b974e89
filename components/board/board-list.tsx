import { EmptyState } from "@/components/ui/empty-state";
import { LinkButton } from "@/components/ui/link-button";
import { dayFromIso } from "@/lib/engine/geometry";
import type { Day } from "@/lib/engine/types";
import type { CampSummary } from "@/lib/schemas/camp";
import { BoardRow } from "./board-row";

interface BoardListProps {
  readonly camps: readonly CampSummary[];
  readonly today: Day;
  /** Whether this reader may lay out a camp. */
  readonly creates: boolean;
}

/** Camps to come by days out, nearest first; what is over or off after them, newest first. */
export function BoardList({ camps, today, creates }: BoardListProps) {
  if (camps.length === 0) {
    return (
      <EmptyState
        title="No camp yet"
        action={
          creates ? (
            <LinkButton href="/camps/new" variant="primary">
              Set a bout
            </LinkButton>
          ) : undefined
        }
      >
        Give a bout date and the camp is laid out around the sport’s own week.
      </EmptyState>
    );
  }
  const dayOf = (camp: CampSummary): Day => dayFromIso(camp.bout.date);
  const open = camps
    .filter((camp) => camp.status === "on" && dayOf(camp) >= today)
    .sort((a, b) => dayOf(a) - dayOf(b));
  const closed = camps.filter((camp) => !open.includes(camp)).sort((a, b) => dayOf(b) - dayOf(a));
  return (
    <>
      {open.length > 0 ? (
        <ol className="grid gap-2">
          {open.map((camp) => (
            <BoardRow key={camp.id} camp={camp} today={today} />
          ))}
        </ol>
      ) : (
        <p className="text-ink-2">No bout is ahead.</p>
      )}
      {closed.length > 0 ? (
        <section className="mt-6">
          <h2 className="mb-2 text-lg font-semibold">Over or off</h2>
          <ol className="grid gap-2">
            {closed.map((camp) => (
              <BoardRow key={camp.id} camp={camp} today={today} />
            ))}
          </ol>
        </section>
      ) : null}
    </>
  );
}
