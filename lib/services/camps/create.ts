import { randomUUID } from "node:crypto";
import { insertCamp, insertRevision, writeEdit } from "@/db/queries/camps";
import { findAthlete, insertAthlete } from "@/db/queries/athletes";
import { writeAudit } from "@/db/queries/audit";
import { listHolds } from "@/db/queries/holds";
import { sessionWrites, writeSessions } from "@/db/queries/sessions";
import { findTeam } from "@/db/queries/teams";
import { sessionsOf } from "@/db/mappers/sessions";
import type { Tx } from "@/db/client";
import { planBook } from "@/lib/book";
import { RecurrenceError } from "@/lib/calendar/recurrence";
import { instantOf } from "@/lib/calendar/zones";
import { PlanInputError } from "@/lib/engine";
import { AppError, notFound } from "@/lib/errors";
import type { CampBook } from "@/lib/schemas/camp-book";
import type { CampForm } from "@/lib/schemas/camp";
import type { TeamContext } from "@/lib/services/context";

function bookOfForm(form: CampForm, rules: Record<string, number>): CampBook {
  return {
    status: "on",
    homeZone: form.homeZone,
    bout: form.bout,
    weeks: form.weeks,
    weighIn: form.weighIn,
    athlete: form.facts,
    sport: form.sport.map((entry) => {
      const id = randomUUID();
      return { ...entry, id, series: id, idShift: 0 };
    }),
    pins: [],
    coachFactors: {},
    responses: [],
    holds: [],
    rules,
  };
}

async function athleteOf(tx: Tx, ctx: TeamContext, form: CampForm): Promise<string> {
  if ("id" in form.athlete) {
    const athlete = await findAthlete(tx, ctx.teamId, form.athlete.id);
    if (!athlete) throw notFound();
    return athlete.id;
  }
  const athlete = await insertAthlete(tx, ctx.teamId, { name: form.athlete.name, ...form.facts });
  return athlete.id;
}

function planned(book: CampBook, now: Date) {
  try {
    return planBook(book, instantOf(now));
  } catch (error) {
    if (error instanceof PlanInputError)
      throw new AppError("invalid", "This camp cannot be laid out.", { errors: error.problems });
    if (error instanceof RecurrenceError) {
      throw new AppError("invalid", "This recurrence cannot be expanded.", {
        errors: [{ pointer: `/sport/${error.entryIndex}/${error.pointerField}`, message: error.message }],
      });
    }
    throw error;
  }
}

/** Lays a camp out and keeps it: camp, sessions and the first revision in one transaction. */
export async function createCamp(
  ctx: TeamContext,
  { body: form }: { body: CampForm },
): Promise<{ id: string }> {
  return ctx.db.transaction(async (tx) => {
    const team = await findTeam(tx, ctx.teamId);
    if (!team) throw notFound();
    const athleteId = await athleteOf(tx, ctx, form);
    return { id: await keepCamp(tx, ctx, athleteId, bookOfForm(form, team.ruleOverrides)) };
  });
}

/** Writes a new camp in the caller's transaction. */
export async function keepCamp(
  tx: Tx,
  ctx: TeamContext,
  athleteId: string,
  draft: CampBook,
): Promise<string> {
  // A hold follows the athlete into a new camp.
  const holds = (await listHolds(tx, ctx.teamId, athleteId)).flatMap(({ hold }) =>
    hold.liftedAt === null ? [{ from: hold.fromDay, to: hold.toDay }] : [],
  );
  const book = { ...draft, holds };
  const { input, plan } = planned(book, ctx.now);
  const { lifts, ...summary } = plan;
  const camp = await insertCamp(tx, ctx.teamId, { athleteId, book, summary, now: ctx.now });
  await writeEdit(tx, ctx.teamId, camp.id, { putSport: book.sport, putPins: book.pins });
  const rows = sessionsOf(book, input, { ...plan, lifts });
  await writeSessions(tx, sessionWrites({ teamId: ctx.teamId, campId: camp.id }, [], rows, ctx.now));
  await insertRevision(tx, {
    teamId: ctx.teamId,
    campId: camp.id,
    number: 1,
    summary: `Laid out the camp, ${book.weeks} ${book.weeks === 1 ? "week" : "weeks"}`,
    idempotencyKey: randomUUID(),
    userId: ctx.userId,
    createdAt: ctx.now,
  });
  await writeAudit(tx, ctx, "camp.create", camp.id, { weeks: book.weeks, bout: book.bout.date });
  return camp.id;
}
