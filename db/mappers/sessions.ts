import { ITEM_TITLES, hhmm, instantAt, isoFromDay } from "../../lib/engine";
import type { Instant, Lift, Plan, PlanInput } from "../../lib/engine/types";
import type { CampBook } from "../../lib/schemas/camp-book";
import type { sessions } from "../schema";

type SessionRow = typeof sessions.$inferSelect;
/** A session as planned, without what the database adds (uid, sequence, time of change). */
export type PlannedSession = Omit<
  SessionRow,
  "teamId" | "campId" | "uid" | "sequence" | "changedAt" | "status"
>;

const dateOf = (instant: Instant): Date => new Date(instant * 60_000);

/** Everything dated in a planned camp, as rows. Instants are exact across daylight-saving changes and travel. */
export function sessionsOf(book: CampBook, input: PlanInput, plan: Plan): PlannedSession[] {
  const place = (day: PlanInput["bout"]["day"], start: PlanInput["bout"]["start"], minutes: number) => {
    const startsAt = instantAt(input.zone, day, start);
    return {
      day: isoFromDay(day),
      start: hhmm(start),
      minutes,
      startsAt: dateOf(startsAt),
      endsAt: dateOf((startsAt + minutes) as Instant),
    };
  };
  const lifts = plan.lifts.map((lift): PlannedSession => ({
    id: lift.id,
    source: "lift",
    kind: lift.item,
    title: ITEM_TITLES[lift.item],
    place: "",
    ...place(lift.day, lift.start, lift.minutes),
    effort: lift.effort,
    pinned: lift.pinned,
    lift,
  }));
  const places = new Map(book.sport.map((entry) => [entry.id, entry.place]));
  const series = new Map(book.sport.map((entry) => [entry.series, entry.place]));
  const sport = input.sport.map((session): PlannedSession => ({
    id: session.id,
    source: "sport",
    kind: session.kind,
    title: session.title,
    place: places.get(session.id) ?? series.get(session.id.split("@")[0] ?? session.id) ?? "",
    ...place(session.day, session.start, session.minutes),
    effort: session.effort,
    pinned: false,
    lift: null,
  }));
  if (book.status === "off") return [...lifts, ...sport];
  const against = book.bout.opponent ? ` v ${book.bout.opponent}` : "";
  const boutMinutes = Math.max(15, Math.ceil((book.bout.rounds ?? 3) * ((book.bout.roundMinutes ?? 3) + 1)));
  const bout: PlannedSession = {
    id: "bout",
    source: "bout",
    kind: "bout",
    title: `Bout${against}`,
    place: book.bout.place,
    ...place(input.bout.day, input.bout.start, boutMinutes),
    effort: 0,
    pinned: false,
    lift: null,
  };
  const weighIn: PlannedSession[] = input.weighIn
    ? [
        {
          id: "weigh-in",
          source: "weigh-in",
          kind: "weigh-in",
          title: "Weigh-in",
          place: book.bout.place,
          ...place(input.weighIn.day, input.weighIn.start, 30),
          effort: 0,
          pinned: false,
          lift: null,
        },
      ]
    : [];
  return [...lifts, ...sport, ...weighIn, bout];
}

/** Lifts that stand, from their rows; `past` is as of `now`, whatever it was when the plan was saved. */
export const liftsOf = (
  rows: readonly Pick<SessionRow, "lift" | "startsAt" | "status">[],
  now: Date,
): Lift[] =>
  rows.flatMap((row) =>
    row.lift && row.status === "confirmed" ? [{ ...row.lift, past: row.startsAt <= now }] : [],
  );
