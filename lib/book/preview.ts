import { RecurrenceError } from "@/lib/calendar/recurrence";
import { PlanInputError, instantAt, knockOn } from "@/lib/engine";
import type { Base, Instant, Plan, PlanInput, SportSession } from "@/lib/engine/types";
import type { CampBook } from "@/lib/schemas/camp-book";
import type { Change } from "@/lib/schemas/change";
import { applyEdit, type BookEdit } from "./edit";
import { editFor } from "./edit-for";
import { campSpan } from "./camp-span";
import { baseOf, planBook, planInputOf } from "./plan-book";
import type { PreviewResult } from "./preview-result";

/** A camp as saved: the book, and the plan that stands. */
export interface StandingCamp {
  readonly book: CampBook;
  readonly plan: Plan;
}

const signature = (session: SportSession): string =>
  [session.id, session.kind, session.day, session.start, session.minutes, session.title].join("|");

/** Sport sessions that are past and lie in both spans must be the same before and after. */
function rewritesPast(before: PlanInput, after: PlanInput, spanFrom: number): boolean {
  const past = (input: PlanInput): Set<string> =>
    new Set(
      input.sport
        .filter(
          (session) =>
            session.day >= spanFrom && instantAt(input.zone, session.day, session.start) <= input.now,
        )
        .map(signature),
    );
  const [old, fresh] = [past(before), past(after)];
  return old.size !== fresh.size || [...old].some((key) => !fresh.has(key));
}

/** What an edit is measured against, where that is not the standing plan and the book's own sport. */
export interface Before {
  /** A put-back gives its own. */
  readonly base?: Base;
  /** Sport as it stands, where the book already holds what changed (a hold). */
  readonly sport?: readonly SportSession[];
}

/** Applies an edit and plans again, measured against the standing plan. */
export function previewEdit(
  standing: StandingCamp,
  edit: BookEdit,
  now: Instant,
  { base, sport }: Before = {},
): PreviewResult {
  const book = applyEdit(standing.book, edit);
  try {
    const before = planInputOf(standing.book, now);
    const { input, plan } = planBook(book, now, base ?? baseOf(standing.plan));
    const spanFrom = Math.max(campSpan(standing.book).from, campSpan(book).from);
    if (rewritesPast(before, input, spanFrom)) {
      return {
        problems: [
          {
            pointer: "/change",
            message: "That would change sessions that are already past; what is past stays.",
          },
        ],
      };
    }
    const stands = sport ?? before.sport;
    const sportBefore =
      standing.book.status === "off"
        ? stands.filter((s) => instantAt(before.zone, s.day, s.start) <= now)
        : stands;
    return {
      edit,
      book,
      input,
      plan,
      knockOn: knockOn({ plan: standing.plan, sport: sportBefore }, { plan, sport: input.sport }),
    };
  } catch (error) {
    if (error instanceof PlanInputError) {
      return {
        problems: error.problems.map(({ pointer, message }) => ({ pointer: `/change${pointer}`, message })),
      };
    }
    if (error instanceof RecurrenceError)
      return { problems: [{ pointer: "/change/values/rrule", message: error.message }] };
    throw error;
  }
}

/** The knock-on of a change, in the browser before it is saved and on the server when it is. */
export function previewChange(
  standing: StandingCamp,
  change: Exclude<Change, { kind: "put-back" }>,
  now: Instant,
): PreviewResult {
  const { zone } = planInputOf(standing.book, now);
  const result = editFor({ book: standing.book, lifts: standing.plan.lifts, zone, now }, change);
  if ("problems" in result) return result;
  return previewEdit(standing, result.edit, now);
}
