import { dayFromIso, hhmm, isoFromDay, minuteFromHhmm } from "@/lib/engine/geometry";
import type { Day, LiftEffect, SportEffect } from "@/lib/engine/types";
import { dayText } from "@/lib/format/civil";
import { ITEM_LOOKS } from "@/components/session/kinds";
import type { LiveChange } from "../desk-state";
import type { Place } from "../move-change";
import type { Picture } from "../picture";

const longDay = new Intl.DateTimeFormat("en-GB", { weekday: "long", day: "numeric", timeZone: "UTC" });
const shortDay = new Intl.DateTimeFormat("en-GB", { weekday: "short", day: "numeric", timeZone: "UTC" });
const dateOfDay = (day: Day): Date => new Date(`${isoFromDay(day)}T00:00:00Z`);

/** "Saturday 5". */
const longDayName = (day: Day): string => longDay.format(dateOfDay(day));
/** "Sat 5". */
const shortDayName = (day: Day): string => shortDay.format(dateOfDay(day));

/** "Save and tell 3 people"; what is told is told by mail. */
export function saveText(people: number, act = "Save"): string {
  if (people === 0) return act;
  return `${act} and tell ${people === 1 ? "1 person" : `${people} people`}`;
}

/** "from Saturday 5 to Thursday 3", or with times where only those differ or both do. */
function fromTo(from: Place, to: Place): string {
  if (from.day === to.day) return `on ${longDayName(from.day)} from ${hhmm(from.start)} to ${hhmm(to.start)}`;
  if (from.start === to.start) return `from ${longDayName(from.day)} to ${longDayName(to.day)}`;
  return `from ${longDayName(from.day)} ${hhmm(from.start)} to ${longDayName(to.day)} ${hhmm(to.start)}`;
}

const SCOPE_TEXT = { this: "", following: " and those after it", all: ", all of them" } as const;

function liftTitle(standing: Picture, id: string): string {
  const lift = standing.plan.lifts.find((candidate) => candidate.id === id);
  return lift ? ITEM_LOOKS[lift.item].label : "a lift";
}

function moveHeading(change: Extract<LiveChange, { kind: "lift.move" }>, standing: Picture): string {
  const title = ITEM_LOOKS[change.item].label;
  const lift = standing.plan.lifts.find((candidate) => candidate.id === change.liftId);
  const to = { day: dayFromIso(change.date), start: minuteFromHhmm(change.start) };
  if (!lift) return `Placing ${title} on ${longDayName(to.day)}`;
  if (lift.day === to.day && lift.start === to.start) return `Pinning ${title} on ${longDayName(to.day)}`;
  return `Moving ${title} ${fromTo(lift, to)}`;
}

function editHeading(change: Extract<LiveChange, { kind: "sport.edit" }>, standing: Picture): string {
  const session = standing.sport.find((candidate) => candidate.id === change.sportId);
  if (!session) return "Editing a session";
  const { date, start, ...facts } = change.values;
  const to = {
    day: date ? dayFromIso(date) : session.day,
    start: start ? minuteFromHhmm(start) : session.start,
  };
  const scope = SCOPE_TEXT[change.scope];
  const moved = to.day !== session.day || to.start !== session.start;
  if (moved && Object.keys(facts).length === 0)
    return `Moving ${session.title}${scope} ${fromTo(session, to)}`;
  return `Editing ${session.title} of ${longDayName(session.day)}${scope}`;
}

/** What is being tried, as the head of the knock-on rail. */
export function changeHeading(change: LiveChange, standing: Picture): string {
  switch (change.kind) {
    case "lift.move":
      return moveHeading(change, standing);
    case "lift.release":
      return `Letting ${liftTitle(standing, change.liftId)} go from its pin`;
    case "lift.factor":
      return `Coach’s factor × ${change.factor.toFixed(2)} for ${liftTitle(standing, change.liftId)}`;
    case "response.add":
      return `Sets × ${change.factor.toFixed(2)} from ${dayText(dayFromIso(change.from))} to ${dayText(dayFromIso(change.to))}`;
    case "response.drop":
      return "Taking back an accepted suggestion";
    case "sport.add":
      return `Adding ${change.values.title} on ${longDayName(dayFromIso(change.values.date))}`;
    case "sport.edit":
      return editHeading(change, standing);
    case "sport.drop": {
      const session = standing.sport.find((candidate) => candidate.id === change.sportId);
      return session
        ? `Taking out ${session.title} of ${longDayName(session.day)}${SCOPE_TEXT[change.scope]}`
        : "Taking out a session";
    }
    case "bout.change":
      return change.bout.date === standing.book.bout.date
        ? "Changing the bout"
        : `Moving the bout to ${dayText(dayFromIso(change.bout.date))}`;
    case "bout.off":
      return "Marking the bout off";
  }
}

/** "Wed 2 → Mon 30", "stays Fri 4", "new on Tue 3 10:00", "was Wed 2". */
export function effectMove({ kind, from, to }: LiftEffect | SportEffect): string {
  if (kind === "added" && to) return `new, ${shortDayName(to.day)} ${hhmm(to.start)}`;
  if (kind === "unplaced") return from ? `was ${shortDayName(from.day)}, has no place now` : "has no place";
  if (kind === "dropped") return from ? `${shortDayName(from.day)}, taken out` : "taken out";
  if (!from || !to) return to ? `stays ${shortDayName(to.day)}` : "";
  if (from.day !== to.day && from.start !== to.start)
    return `${shortDayName(from.day)} ${hhmm(from.start)} → ${shortDayName(to.day)} ${hhmm(to.start)}`;
  if (from.day !== to.day) return `${shortDayName(from.day)} → ${shortDayName(to.day)}`;
  if (from.start !== to.start) return `${shortDayName(from.day)}, ${hhmm(from.start)} → ${hhmm(to.start)}`;
  return `stays ${shortDayName(to.day)}`;
}
