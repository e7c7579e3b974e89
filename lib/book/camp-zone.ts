import { offsetSteps } from "@/lib/calendar/zones";
import { dayFromIso } from "@/lib/engine/geometry";
import type { Day, OffsetStep, SportSession } from "@/lib/engine/types";
import type { CampBook } from "@/lib/schemas/camp-book";
import { campSpan } from "./camp-span";

/** What of a camp book says where the athlete is. */
export type Whereabouts = Pick<CampBook, "homeZone" | "weighIn" | "weeks"> & {
  readonly bout: Pick<CampBook["bout"], "date" | "timeZone">;
};
type DatedKind = Pick<SportSession, "kind" | "day">;

/**
 * First day that is lived in the venue's zone: the day after the last travel before the bout; without travel, the day
 * of the weigh-in, else the bout's own.
 */
function venueFrom(book: Whereabouts, sport: readonly DatedKind[]): Day {
  const boutDay = dayFromIso(book.bout.date);
  const travel = sport.filter((session) => session.kind === "travel" && session.day < boutDay).at(-1);
  if (travel) return (travel.day + 1) as Day;
  return book.weighIn ? dayFromIso(book.weighIn.date) : boutDay;
}

/** Offsets of the athlete's wall clock over the camp: the gym's zone, then the venue's. `sport` is the camp's, expanded. */
export function zoneOf(book: Whereabouts, sport: readonly DatedKind[]): OffsetStep[] {
  const { from, to } = campSpan(book);
  return offsetSteps({
    homeZone: book.homeZone,
    venueZone: book.bout.timeZone,
    from: (from - 7) as Day,
    to: (to + 2) as Day,
    venueFrom: venueFrom(book, sport),
  });
}
