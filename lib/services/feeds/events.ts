import type { listFeedSessions } from "@/db/queries/feeds";
import type { FeedEvent } from "@/lib/calendar/feed";
import { dayFromIso, minuteFromHhmm } from "@/lib/engine";
import type { Intensity, Lift } from "@/lib/engine/types";
import { momentText } from "@/lib/format/civil";
import { can, type Member } from "@/lib/policy";

export type FeedSession = Awaited<ReturnType<typeof listFeedSessions>>[number];

/** Who runs the sport sessions sees that there is lifting, not how much; a guest sees dates alone. */
export const seesSets = (member: Member, athleteId: string): boolean =>
  member.role !== "skills" && can(member, "lifts.detail", athleteId);

const span = (low: number, high: number): string => (low === high ? `${low}` : `${low} to ${high}`);

const intensityText = ({ low, high, of }: Intensity): string =>
  of === "best" ? `at ${span(low, high)} % of the best` : `with ${span(low, high)} in reserve`;

const liftText = (lift: Lift): string =>
  `${lift.sets} working ${lift.sets === 1 ? "set" : "sets"} ${intensityText(lift.intensity)}\nExpected effort ${lift.effort} of 10`;

/** The venue's own clock: a phone may show the bout in the zone it happens to be in. */
function venueText({ session, boutZone }: FeedSession): string {
  const at = momentText({ day: dayFromIso(session.day), start: minuteFromHhmm(session.start) });
  return `${at} on the clock there (${boutZone})`;
}

function descriptionOf(row: FeedSession, sets: boolean, effort: boolean): string {
  const { session } = row;
  if (session.source === "bout" || session.source === "weigh-in") return venueText(row);
  if (session.lift) return sets ? liftText(session.lift) : "";
  return effort && session.effort > 0 ? `Expected effort ${session.effort} of 10` : "";
}

/** Sessions as the owner of a feed may see them; a team's calendar says whose they are. */
export function eventsOf(
  rows: readonly FeedSession[],
  member: Member,
  scope: "athlete" | "team",
): FeedEvent[] {
  return rows.map((row): FeedEvent => {
    const { session, athlete } = row;
    const detail = can(member, "lifts.detail", athlete.id);
    return {
      uid: session.uid,
      source: session.source,
      title: scope === "team" ? `${athlete.name}: ${session.title}` : session.title,
      description: descriptionOf(row, seesSets(member, athlete.id), detail),
      place: session.place,
      startsAt: session.startsAt,
      endsAt: session.endsAt,
      busy: session.kind !== "rest",
      cancelled: session.status === "cancelled",
      sequence: session.sequence,
      changedAt: session.changedAt,
    };
  });
}
