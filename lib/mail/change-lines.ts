import { ITEM_TITLES, instantAt } from "@/lib/engine";
import type { Day, Minute, OffsetStep } from "@/lib/engine/types";
import { momentText } from "@/lib/format/civil";
import { formatInstant } from "@/lib/format/dates";
import { mailSettings } from "./settings";
import type { NetLift, NetSport } from "./net-effect";

/** One session that changed. Times are in the reader's zone, the session's own beside where they differ. */
export interface ChangeLine {
  readonly title: string;
  readonly url: string;
  /** "Wed 2 Dec 18:00 → Mon 30 Nov 18:00", or what else became of it. */
  readonly what: string;
  /** "16 → 12 sets"; null where there are none, or not for the reader. */
  readonly sets: string | null;
  readonly why: readonly string[];
}

export interface LineContext {
  readonly campId: string;
  readonly zoneBefore: readonly OffsetStep[];
  readonly zoneAfter: readonly OffsetStep[];
  readonly readerZone: string;
  /** Sets and reasons are told. */
  readonly detail: boolean;
}

interface Place {
  readonly day: Day;
  readonly start: Minute;
}

const dateAt = (zone: readonly OffsetStep[], { day, start }: Place): Date =>
  new Date(instantAt(zone, day, start) * 60_000);

/** "Sat 5 Dec 18:00", with the session's local time behind it where the reader lives by another clock. */
function placeText(zone: readonly OffsetStep[], place: Place, readerZone: string): string {
  const [read, local] = [formatInstant(dateAt(zone, place), readerZone), momentText(place)];
  return read === local ? read : `${read} (${local} local time)`;
}

const sessionUrl = (campId: string, sessionId: string): string =>
  `${mailSettings().appUrl}/camps/${campId}?session=${encodeURIComponent(sessionId)}`;

function moveText(was: Place | null, is: Place | null, context: LineContext, gone: string): string {
  const from = was && placeText(context.zoneBefore, was, context.readerZone);
  const to = is && placeText(context.zoneAfter, is, context.readerZone);
  if (from && to) return from === to ? to : `${from} → ${to}`;
  if (to) return `New: ${to}`;
  return from ? `${gone}: was ${from}` : gone;
}

const setsText = (before: number | null, after: number | null): string | null => {
  if (after === null) return null;
  if (before === null) return `${after} sets`;
  return before === after ? `${after} sets, as before` : `${before} → ${after} sets`;
};

function liftLine(lift: NetLift, context: LineContext): ChangeLine {
  return {
    title: ITEM_TITLES[lift.item],
    url: sessionUrl(context.campId, lift.id),
    what: moveText(
      lift.before?.at ?? null,
      lift.after?.at ?? null,
      context,
      lift.unplaced ? "Finds no place" : "Taken out",
    ),
    sets: context.detail ? setsText(lift.before?.sets ?? null, lift.after?.sets ?? null) : null,
    why: context.detail ? lift.because.map((reason) => reason.text) : [],
  };
}

function sportLine(sport: NetSport, context: LineContext): ChangeLine {
  const { before, after } = sport;
  const time = moveText(before, after, context, "Taken out");
  const stays = before && after && before.day === after.day && before.start === after.start;
  const length =
    before && after && before.minutes !== after.minutes
      ? `${before.minutes} → ${after.minutes} minutes`
      : null;
  const what = [time, length, stays && !length ? "details changed" : null]
    .filter((part) => part !== null)
    .join(", ");
  return { title: sport.title, url: sessionUrl(context.campId, sport.id), what, sets: null, why: [] };
}

/** A lift that keeps its place, or never had one, is nothing to tell to someone who is not told the sets. */
const isMove = ({ before, after }: NetLift): boolean =>
  before !== null && after !== null
    ? before.at.day !== after.at.day || before.at.start !== after.at.start
    : before !== after;

/** One line a session, in the order in which they now stand (or stood, where they are gone). */
export function linesOf(
  net: { lifts: readonly NetLift[]; sport: readonly NetSport[] },
  context: LineContext,
): ChangeLine[] {
  const order = (before: Place | null, after: Place | null): number => {
    if (after) return dateAt(context.zoneAfter, after).getTime();
    return before ? dateAt(context.zoneBefore, before).getTime() : Number.MAX_SAFE_INTEGER;
  };
  const lifts = net.lifts
    .filter((lift) => context.detail || isMove(lift))
    .map((lift) => ({
      at: order(lift.before?.at ?? null, lift.after?.at ?? null),
      line: liftLine(lift, context),
    }));
  const sport = net.sport.map((session) => ({
    at: order(session.before, session.after),
    line: sportLine(session, context),
  }));
  return [...sport, ...lifts].sort((a, b) => a.at - b.at).map(({ line }) => line);
}
