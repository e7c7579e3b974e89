import { and, asc, desc, eq, gt, gte, inArray, isNull, lte, sql } from "drizzle-orm";
import type { BookEdit } from "../../lib/book/edit";
import type { CampBook } from "../../lib/schemas/camp-book";
import type { Tx } from "../client";
import { campColumnsOf } from "../mappers/camp-book";
import { athletes, camps, holds, pins, revisions, sessions, sportEntries, teams, users } from "../schema";

export type CampRow = typeof camps.$inferSelect;

/** Locks the row for the rest of the transaction: two saves of one camp wait for each other. */
export async function lockCamp(tx: Tx, teamId: string, campId: string): Promise<CampRow | null> {
  const [row] = await tx
    .select()
    .from(camps)
    .where(and(eq(camps.teamId, teamId), eq(camps.id, campId)))
    .for("update");
  return row ?? null;
}

export async function findCamp(tx: Tx, teamId: string, campId: string): Promise<CampRow | null> {
  const [row] = await tx
    .select()
    .from(camps)
    .where(and(eq(camps.teamId, teamId), eq(camps.id, campId)));
  return row ?? null;
}

/** Camps of an athlete whose bout is not over, for re-planning. */
export async function listOpenCampIds(
  tx: Tx,
  teamId: string,
  fromDate: string,
  athleteId?: string,
): Promise<string[]> {
  const rows = await tx
    .select({ id: camps.id })
    .from(camps)
    .where(
      and(
        eq(camps.teamId, teamId),
        eq(camps.status, "on"),
        gte(camps.boutDate, fromDate),
        athleteId === undefined ? undefined : eq(camps.athleteId, athleteId),
      ),
    )
    .orderBy(asc(camps.id));
  return rows.map((row) => row.id);
}

/** An instant as the wall clock of a zone shows it, YYYY-MM-DDTHH:MM. */
const onTheClock = (at: typeof holds.createdAt | typeof holds.liftedAt, zone: string) =>
  sql<string | null>`to_char(${at} at time zone ${zone}, 'YYYY-MM-DD"T"HH24:MI')`;

/** What stands beside the camp's own row. Lifted holds too: what they took out of the past stays out. */
export async function loadCampParts(tx: Tx, camp: CampRow) {
  const inCamp = <T extends typeof sportEntries | typeof pins | typeof sessions>(table: T) =>
    and(eq(table.teamId, camp.teamId), eq(table.campId, camp.id));
  const [sport, pinRows, holdRows, sessionRows, [team], [athlete]] = await Promise.all([
    tx.select().from(sportEntries).where(inCamp(sportEntries)).orderBy(asc(sportEntries.id)),
    tx.select().from(pins).where(inCamp(pins)).orderBy(asc(pins.liftId)),
    tx
      .select({
        fromDay: holds.fromDay,
        toDay: holds.toDay,
        setAt: onTheClock(holds.createdAt, camp.homeZone),
        liftedAt: onTheClock(holds.liftedAt, camp.homeZone),
      })
      .from(holds)
      .where(and(eq(holds.teamId, camp.teamId), eq(holds.athleteId, camp.athleteId)))
      .orderBy(asc(holds.fromDay), asc(holds.createdAt)),
    tx.select().from(sessions).where(inCamp(sessions)).orderBy(asc(sessions.startsAt), asc(sessions.id)),
    tx.select({ rules: teams.ruleOverrides }).from(teams).where(eq(teams.id, camp.teamId)),
    tx
      .select({ id: athletes.id, name: athletes.name })
      .from(athletes)
      .where(and(eq(athletes.teamId, camp.teamId), eq(athletes.id, camp.athleteId))),
  ]);
  if (!team || !athlete) throw new Error("A camp without team or athlete cannot be.");
  return { sport, pins: pinRows, holds: holdRows, sessions: sessionRows, rules: team.rules, athlete };
}
export type CampParts = Awaited<ReturnType<typeof loadCampParts>>;

export async function insertCamp(
  tx: Tx,
  teamId: string,
  values: { athleteId: string; book: CampBook; summary: CampRow["summary"]; now: Date },
): Promise<CampRow> {
  const [row] = await tx
    .insert(camps)
    .values({
      teamId,
      athleteId: values.athleteId,
      summary: values.summary,
      changedAt: values.now,
      createdAt: values.now,
      revision: 1,
      ...campColumnsOf(values.book),
    })
    .returning();
  if (!row) throw new Error("Insert returned no row.");
  return row;
}

export async function updateCamp(
  tx: Tx,
  camp: CampRow,
  values: { book: CampBook; summary: CampRow["summary"]; revision: number; now: Date },
): Promise<void> {
  await tx
    .update(camps)
    .set({
      ...campColumnsOf(values.book),
      summary: values.summary,
      revision: values.revision,
      changedAt: values.now,
    })
    .where(and(eq(camps.teamId, camp.teamId), eq(camps.id, camp.id)));
}

/** Writes what an edit puts and drops. */
export async function writeEdit(tx: Tx, teamId: string, campId: string, edit: BookEdit): Promise<void> {
  const scope = { teamId, campId };
  if (edit.dropSport?.length) {
    await tx
      .delete(sportEntries)
      .where(
        and(
          eq(sportEntries.teamId, teamId),
          eq(sportEntries.campId, campId),
          inArray(sportEntries.id, [...edit.dropSport]),
        ),
      );
  }
  if (edit.dropPins?.length) {
    await tx
      .delete(pins)
      .where(and(eq(pins.teamId, teamId), eq(pins.campId, campId), inArray(pins.liftId, [...edit.dropPins])));
  }
  if (edit.putSport?.length) {
    await tx
      .insert(sportEntries)
      .values(edit.putSport.map((entry) => ({ ...entry, ...scope })))
      .onConflictDoUpdate({
        target: [sportEntries.campId, sportEntries.id],
        set: {
          series: sql`excluded.series`,
          idShift: sql`excluded.id_shift`,
          kind: sql`excluded.kind`,
          title: sql`excluded.title`,
          start: sql`excluded.start`,
          minutes: sql`excluded.minutes`,
          effort: sql`excluded.effort`,
          place: sql`excluded.place`,
          rrule: sql`excluded.rrule`,
          exdate: sql`excluded.exdate`,
        },
      });
  }
  if (edit.putPins?.length) {
    await tx
      .insert(pins)
      .values(
        edit.putPins.map(({ liftId, item, week, date, start }) => ({
          liftId,
          item,
          week,
          day: date,
          start,
          ...scope,
        })),
      )
      .onConflictDoUpdate({
        target: [pins.campId, pins.liftId],
        set: {
          item: sql`excluded.item`,
          week: sql`excluded.week`,
          day: sql`excluded.day`,
          start: sql`excluded.start`,
        },
      });
  }
}

/** Camps of a team (or of one athlete) with what the board shows, nearest bout first. */
export async function listCamps(
  tx: Tx,
  teamId: string,
  window: { from: Date; to: Date; athleteId?: string },
) {
  const rows = await tx
    .select({ camp: camps, athleteName: athletes.name })
    .from(camps)
    .innerJoin(athletes, and(eq(athletes.id, camps.athleteId), eq(athletes.teamId, camps.teamId)))
    .where(
      and(
        eq(camps.teamId, teamId),
        window.athleteId === undefined ? undefined : eq(camps.athleteId, window.athleteId),
      ),
    )
    .orderBy(asc(camps.boutDate), asc(athletes.name));
  const [next, held] = await Promise.all([
    tx
      .select({
        campId: sessions.campId,
        id: sessions.id,
        day: sessions.day,
        start: sessions.start,
        source: sessions.source,
        kind: sessions.kind,
        title: sessions.title,
      })
      .from(sessions)
      .where(
        and(
          eq(sessions.teamId, teamId),
          eq(sessions.status, "confirmed"),
          gt(sessions.endsAt, window.from),
          lte(sessions.startsAt, window.to),
        ),
      )
      .orderBy(asc(sessions.startsAt), asc(sessions.id)),
    tx
      .select({ athleteId: holds.athleteId, fromDay: holds.fromDay, toDay: holds.toDay })
      .from(holds)
      .where(and(eq(holds.teamId, teamId), isNull(holds.liftedAt))),
  ]);
  return { rows, next, held };
}

export async function insertRevision(tx: Tx, values: typeof revisions.$inferInsert): Promise<void> {
  await tx.insert(revisions).values(values);
}

export async function findRevisionByKey(tx: Tx, teamId: string, campId: string, key: string) {
  const [row] = await tx
    .select()
    .from(revisions)
    .where(
      and(eq(revisions.teamId, teamId), eq(revisions.campId, campId), eq(revisions.idempotencyKey, key)),
    );
  return row ?? null;
}

export async function findRevision(tx: Tx, teamId: string, campId: string, number: number) {
  const [row] = await tx
    .select()
    .from(revisions)
    .where(and(eq(revisions.teamId, teamId), eq(revisions.campId, campId), eq(revisions.number, number)));
  return row ?? null;
}

/** Revisions after `after`, newest first, with the name of who saved them. */
export async function listRevisions(tx: Tx, teamId: string, campId: string, after = 0) {
  return tx
    .select({
      number: revisions.number,
      change: revisions.change,
      inverse: revisions.inverse,
      knockOn: revisions.knockOn,
      summary: revisions.summary,
      putBackOf: revisions.putBackOf,
      at: revisions.createdAt,
      by: users.name,
    })
    .from(revisions)
    .leftJoin(users, eq(users.id, revisions.userId))
    .where(and(eq(revisions.teamId, teamId), eq(revisions.campId, campId), gt(revisions.number, after)))
    .orderBy(desc(revisions.number));
}

/** Tells every server process that a camp has a new revision, when the transaction commits. */
export async function notifyCampChanged(tx: Tx, campId: string, revision: number): Promise<void> {
  await tx.execute(sql`select pg_notify('camp_changed', ${`${campId}:${revision}`})`);
}
