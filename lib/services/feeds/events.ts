import type { listFeedSessions } from "@/db/queries/feeds";
import type { FeedEvent } from "@/lib/calendar/feed";
import { dayFromIso, minuteFromHhmm } from "@/lib/engine";
import type { Intensity, Lift } from "@/lib/engine/types";
import { momentText } from "@/lib/format/civil";
import { can, type Member } from "@/lib/policy";

export type FeedSession = Awaited<ReturnType<typeof listFeedSessions>>[number];

/** Who runs the sport sessions sees that there is lifting, not how much; a guest sees dates alone. */
const seesSets = (member: Member, athleteId: string): boolean =>
  member.role !== "skills" && can(member, "lifts.detail", athleteId);

const span = (low: number, high: number): string => (low === high ? `${low}` : `${low} to ${high}`);

const intensityText = ({ low, high, of }: Intensity): string =>
  of === "best" ? `at ${span(low, high)} % of the best` : `with ${span(low, high)} in reserve`;

const liftText = (lift: Pick<Lift, "sets" | "intensity" | "effort">): string =>
  `${lift.sets} working ${lift.sets === 1 ? "set" : "sets"} ${intensityText(lift.intensity)}\nExpected effort ${lift.effort} of 10`;

/** The venue's own clock: a phone may show the bout in the zone it happens to be in. */
function venueText({ day, start, boutZone }: FeedSession): string {
  const at = momentText({ day: dayFromIso(day), start: minuteFromHhmm(start) });
  return `${at} on the clock there (${boutZone})`;
}

function descriptionOf(row: FeedSession, sets: boolean, effort: boolean): string {
  if (row.source === "bout" || row.source === "weigh-in") return venueText(row);
  if (row.lift) return sets ? liftText(row.lift) : "";
  return effort && row.effort > 0 ? `Expected effort ${row.effort} of 10` : "";
}

/** Sessions as the owner of a feed may see them; a team's calendar says whose they are. */
export function eventsOf(
  rows: readonly FeedSession[],
  member: Member,
  scope: "athlete" | "team",
): FeedEvent[] {
  return rows.map((row): FeedEvent => {
    const { uid, source, title, place, startsAt, endsAt, sequence, changedAt, athleteId, athleteName } = row;
    const effort = can(member, "lifts.detail", athleteId);
    return {
      uid,
      source,
      title: scope === "team" ? `${athleteName}: ${title}` : title,
      description: descriptionOf(row, seesSets(member, athleteId), effort),
      place,
      startsAt,
      endsAt,
      busy: row.kind !== "rest",
      cancelled: row.status === "cancelled",
      sequence,
      changedAt,
    };
  });
}
