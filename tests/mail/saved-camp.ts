import { eq } from "drizzle-orm";
import type { Database } from "@/db/client";
import { insertCamp, insertRevision, writeEdit, type CampRow } from "@/db/queries/camps";
import { camps } from "@/db/schema";
import { dayFromIso, minuteFromHhmm } from "@/lib/engine";
import type { Item, KnockOn, LiftEffect, SportEffect } from "@/lib/engine/types";
import { queueChangeMail } from "@/lib/mail/notices";
import type { BookEdit } from "@/lib/book";
import type { CampBook } from "@/lib/schemas/camp-book";
import { randomUUID } from "node:crypto";
import { campBook } from "../factories/camp-book";

/** "2026-12-02 18:00" as the engine's day and minute. */
export const at = (text: string) => {
  const [day = "", time = ""] = text.split(" ");
  return { day: dayFromIso(day), start: minuteFromHhmm(time) };
};

export const liftMoved = (
  id: string,
  item: Item,
  from: string,
  to: string,
  over: Partial<LiftEffect> = {},
): LiftEffect => ({
  id,
  item,
  kind: "moved",
  from: at(from),
  to: at(to),
  setsBefore: 16,
  setsAfter: 12,
  because: [],
  ...over,
});

export const sportMoved = (
  id: string,
  from: string,
  to: string,
  over: Partial<SportEffect> = {},
): SportEffect => ({
  id,
  title: "Hard sparring",
  sport: "hard-sparring",
  kind: "moved",
  from: { ...at(from), minutes: 60 },
  to: { ...at(to), minutes: 60 },
  ...over,
});

export const knockOn = (over: Partial<KnockOn>): KnockOn => ({
  lifts: [],
  sport: [],
  weeks: [],
  violations: [],
  bout: null,
  ...over,
});

const SUMMARY: CampRow["summary"] = {
  bout: at("2027-01-09 20:30"),
  weeks: [],
  phases: [],
  unplaced: [],
  violations: [],
  days: [],
  form: { from: dayFromIso("2026-11-15"), values: [], stopsHelping: 0, helpsMost: 0 },
  cost: 0,
  causes: [],
};

/** A saved camp of one athlete; its plan does not matter to mail, its book and revisions do. */
export async function savedCamp(
  db: Database,
  teamId: string,
  athleteId: string,
  over: Partial<CampBook> = {},
): Promise<string> {
  const book = campBook(over);
  const row = await insertCamp(db, teamId, {
    athleteId,
    book,
    summary: SUMMARY,
    now: new Date("2026-11-20T12:00:00Z"),
  });
  await writeEdit(db, teamId, row.id, { putSport: book.sport });
  return row.id;
}

export interface Saved {
  readonly knockOn: KnockOn;
  readonly by: string;
  readonly to: readonly string[];
  readonly now: Date;
  readonly urgent?: boolean;
  readonly edit?: BookEdit;
  readonly inverse?: BookEdit;
}

/** A saved revision as the change service writes it, told to `to`. Returns its number. */
export async function revise(db: Database, teamId: string, campId: string, saved: Saved): Promise<number> {
  return db.transaction(async (tx) => {
    const [camp] = await tx.select().from(camps).where(eq(camps.id, campId)).for("update");
    const revision = (camp?.revision ?? 0) + 1;
    await tx.update(camps).set({ revision }).where(eq(camps.id, campId));
    await insertRevision(tx, {
      teamId,
      campId,
      number: revision,
      change: null,
      edit: saved.edit ?? {},
      inverse: saved.inverse ?? {},
      knockOn: saved.knockOn,
      summary: "Changed",
      idempotencyKey: randomUUID(),
      userId: saved.by,
      createdAt: saved.now,
    });
    await queueChangeMail(tx, {
      teamId,
      campId,
      revision,
      userIds: saved.to,
      urgent: saved.urgent ?? false,
      now: saved.now,
    });
    return revision;
  });
}
