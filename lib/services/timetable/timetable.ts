import { randomUUID } from "node:crypto";
import { writeAudit } from "@/db/queries/audit";
import {
  countTimetable,
  deleteTimetableEntry,
  insertTimetableEntry,
  listTimetable,
  updateTimetableEntry,
  type TimetableRow,
} from "@/db/queries/timetable";
import { occurrenceDays, RecurrenceError } from "@/lib/calendar/recurrence";
import { dayFromIso } from "@/lib/engine";
import type { Day } from "@/lib/engine/types";
import { AppError, notFound } from "@/lib/errors";
import type { TimetableEntry, TimetableForm } from "@/lib/schemas/timetable";
import type { TeamContext } from "@/lib/services/context";

type ById = { params: Record<string, string> };

/** Sessions that a gym's week may have: each costs every new camp its share of the expansion. */
const MOST_ENTRIES = 200;

const entryOf = ({
  teamId: _team,
  series: _series,
  idShift: _shift,
  ...entry
}: TimetableRow): TimetableEntry => entry;

/** The gym's week, from which new camps take their sport sessions. */
export async function readTimetable(ctx: TeamContext): Promise<{ entries: TimetableEntry[] }> {
  return { entries: (await listTimetable(ctx.db, ctx.teamId)).map(entryOf) };
}

/** Refuses a recurrence that no camp could be laid out with. */
function mustRecur(form: TimetableForm): void {
  const from = dayFromIso(form.start.slice(0, 10));
  try {
    occurrenceDays(form, from, (from + 366) as Day);
  } catch (error) {
    if (!(error instanceof RecurrenceError)) throw error;
    throw new AppError("invalid", "This recurrence cannot be expanded.", {
      errors: [{ pointer: `/${error.pointerField}`, message: error.message }],
    });
  }
}

export async function addToTimetable(
  ctx: TeamContext,
  { body }: { body: TimetableForm },
): Promise<TimetableEntry> {
  mustRecur(body);
  return ctx.db.transaction(async (tx) => {
    if ((await countTimetable(tx, ctx.teamId)) >= MOST_ENTRIES)
      throw new AppError("conflict", `The gym's week has ${MOST_ENTRIES} sessions. Delete one first.`);
    const id = randomUUID();
    await insertTimetableEntry(tx, ctx.teamId, id, body);
    await writeAudit(tx, ctx, "timetable.add", id, { title: body.title });
    return { ...body, id };
  });
}

/** Changes a session of the gym's week. Camps that run have their own copy and stay as they are. */
export async function editTimetable(
  ctx: TeamContext,
  { params, body }: ById & { body: TimetableForm },
): Promise<TimetableEntry> {
  mustRecur(body);
  return ctx.db.transaction(async (tx) => {
    const id = params.id ?? "";
    if (!(await updateTimetableEntry(tx, ctx.teamId, id, body))) throw notFound();
    await writeAudit(tx, ctx, "timetable.edit", id, { title: body.title });
    return { ...body, id };
  });
}

export async function dropFromTimetable(ctx: TeamContext, { params }: ById): Promise<void> {
  await ctx.db.transaction(async (tx) => {
    const id = params.id ?? "";
    if (!(await deleteTimetableEntry(tx, ctx.teamId, id))) throw notFound();
    await writeAudit(tx, ctx, "timetable.drop", id);
  });
}
