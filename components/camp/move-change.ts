import { hhmm, isoFromDay } from "@/lib/engine/geometry";
import type { Day, Minute } from "@/lib/engine/types";
import type { LiveChange } from "./desk-state";
import type { Picture } from "./picture";

export interface Place {
  readonly day: Day;
  readonly start: Minute;
}

/**
 * The change that puts a session somewhere else. What is being tried out on the same session already is kept: a move
 * changes only its day and time. Null where the session cannot be moved by itself.
 */
export function moveChange(
  standing: Picture,
  trying: LiveChange | null,
  id: string,
  to: Place,
): LiveChange | null {
  const date = isoFromDay(to.day);
  const start = hhmm(to.start);
  const lift = standing.plan.lifts.find((candidate) => candidate.id === id);
  if (lift) return { kind: "lift.move", liftId: lift.id, item: lift.item, week: lift.week, date, start };
  if (trying?.kind === "sport.add" && trying.entryId === id) {
    return { ...trying, values: { ...trying.values, date, start } };
  }
  if (trying?.kind === "sport.edit" && trying.sportId === id) {
    return { ...trying, values: { ...trying.values, date, start } };
  }
  const sport = standing.sport.find((candidate) => candidate.id === id);
  return sport ? { kind: "sport.edit", sportId: sport.id, scope: "this", values: { date, start } } : null;
}

/** The session that a change is about, or null for a change of the bout. */
export function subjectOf(change: LiveChange): string | null {
  switch (change.kind) {
    case "lift.move":
    case "lift.release":
    case "lift.factor":
      return change.liftId;
    case "sport.edit":
    case "sport.drop":
      return change.sportId;
    case "sport.add":
      return change.entryId;
    case "response.add":
    case "response.drop":
    case "bout.change":
    case "bout.off":
      return null;
  }
}
