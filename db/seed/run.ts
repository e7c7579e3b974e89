import { hash } from "@node-rs/argon2";
import { isoFromDay, weekdayOf } from "../../lib/engine";
import type { Day } from "../../lib/engine/types";
import { civilNow } from "../../lib/calendar/zones";
import { keepCamp } from "../../lib/services/camps/create";
import { replanAthlete } from "../../lib/services/camps/replan";
import { saveChange } from "../../lib/services/camps/save-change";
import type { TeamContext } from "../../lib/services/context";
import { ensureLibrary } from "../../lib/services/exercises/library";
import { openDatabase, type Database, type Transaction } from "../client";
import { athletes, camps, holds, memberships, teams, timetableEntries, users } from "../schema";
import demo from "./accounts.json";
import { demoBook, factsOf, weeklyEntry } from "./book";
import { seedLogs } from "./logs";
import { ATHLETES, GYM_WEEK, TEAM, type DemoAthlete } from "./scenario";
import type { Role } from "../../lib/policy/roles";

const DAY_MS = 86_400_000;
const only = <T>(rows: T[]): T => {
  const [row] = rows;
  if (row === undefined) throw new Error("Insert returned no row.");
  return row;
};

async function insertPeople(tx: Transaction, teamId: string): Promise<Map<Role, string>> {
  const passwordHash = await hash(demo.password, { memoryCost: 19_456, timeCost: 2, parallelism: 1 });
  const rows = await tx
    .insert(users)
    .values(
      demo.accounts.map(({ name, email, role }) => ({
        name,
        email,
        passwordHash,
        timeZone: role === "guest" ? "America/New_York" : TEAM.timeZone,
        currentTeamId: teamId,
      })),
    )
    .returning({ id: users.id, email: users.email });
  return new Map(
    demo.accounts.map(({ email, role }) => [role as Role, rows.find((row) => row.email === email)?.id ?? ""]),
  );
}

async function insertAthletes(tx: Transaction, teamId: string): Promise<Map<string, string>> {
  const rows = await tx
    .insert(athletes)
    .values(
      ATHLETES.map((athlete) => ({
        teamId,
        name: athlete.name,
        sport: athlete.sport,
        dateOfBirth: athlete.dateOfBirth,
        limitations: athlete.limitations,
        limitationCodes: [...athlete.limitationCodes],
        secondBase: athlete.second?.base ?? null,
        secondShare: athlete.second?.share ?? null,
        equipment: [...athlete.equipment],
        plateUnit: athlete.plates?.unit ?? "kg",
        plateStep: athlete.plates?.step ?? 2.5,
        ...factsOf(athlete),
      })),
    )
    .returning({ id: athletes.id, name: athletes.name });
  return new Map(rows.map((row) => [row.name, row.id]));
}

/** Lays a camp out as of the day the bout was signed, so that what lies behind it was really planned. */
async function layOutCamp(
  db: Database,
  ctx: TeamContext,
  athlete: DemoAthlete,
  athleteId: string,
  today: string,
  key: string,
) {
  const camp = athlete.camp;
  if (!camp) return null;
  const signed = new Date(ctx.now.getTime() - camp.signedDaysAgo * DAY_MS);
  return db.transaction((tx) =>
    keepCamp(tx, { ...ctx, now: signed }, athleteId, demoBook(athlete, camp, today, key)),
  );
}

/** A change of last week: the head coach moved a hard sparring day, which knocked on to the lifting. */
async function moveSparring(ctx: TeamContext, campId: string, today: Day): Promise<void> {
  const saturday = (today + ((6 - weekdayOf(today) + 7) % 7) + 7) as Day;
  await saveChange(
    { ...ctx, now: new Date(ctx.now.getTime() - 3 * DAY_MS) },
    {
      params: { id: campId },
      body: {
        baseRevision: 1,
        idempotencyKey: "5d1f0a52-6f0e-4b57-9a55-0c7f3a1f7b01",
        change: {
          kind: "sport.edit",
          sportId: `tamsin-6@${isoFromDay(saturday)}`,
          scope: "this",
          values: { date: isoFromDay((saturday - 2) as Day), start: "18:00" },
        },
      },
    },
  );
}

/** Fills an empty database with the demo; does nothing when a team exists. */
async function seed(db: Database, now: Date): Promise<boolean> {
  const existing = await db.select({ id: teams.id }).from(teams).limit(1);
  if (existing.length > 0) return false;
  const today = civilNow(TEAM.timeZone, now).day;
  const base = await db.transaction(async (tx) => {
    const team = only(await tx.insert(teams).values(TEAM).returning({ id: teams.id }));
    const people = await insertPeople(tx, team.id);
    const roster = await insertAthletes(tx, team.id);
    const tamsin = roster.get("Tamsin Velloso") ?? null;
    await tx.insert(memberships).values(
      [...people].map(([role, userId]) => ({
        teamId: team.id,
        userId,
        role,
        athleteId: role === "athlete" || role === "guest" ? tamsin : null,
      })),
    );
    await tx.insert(timetableEntries).values(
      GYM_WEEK.map((session) => ({
        teamId: team.id,
        ...weeklyEntry(session, "gym", (today - 28) as Day, null),
      })),
    );
    return { teamId: team.id, people, roster };
  });
  const actor = (role: Role): TeamContext => ({
    db,
    teamId: base.teamId,
    userId: base.people.get(role) ?? "",
    member: { role, athleteId: null },
    now,
  });
  for (const athlete of ATHLETES) {
    const athleteId = base.roster.get(athlete.name) ?? "";
    const key = (athlete.name.split(" ")[0] ?? athlete.name).toLowerCase();
    const campId = await layOutCamp(db, actor("head"), athlete, athleteId, isoFromDay(today), key);
    if (key === "tamsin" && campId) await moveSparring(actor("head"), campId, today);
    if (athlete.holdDaysAgo === undefined) continue;
    const fromDay = isoFromDay((today - athlete.holdDaysAgo) as Day);
    await db.transaction(async (tx) => {
      await tx.insert(holds).values({
        teamId: base.teamId,
        athleteId,
        fromDay,
        toDay: null,
        setBy: base.people.get("medic") ?? null,
        reason: "Headache after sparring on the evening before; rest, then graded return after examination.",
      });
      await replanAthlete(tx, actor("medic"), athleteId, "A hold was set");
    });
  }
  await seedLogs(db, { teamId: base.teamId, today, now });
  return (await db.select({ id: camps.id }).from(camps).limit(1)).length > 0;
}

const url = process.env.DATABASE_URL;
if (!url) throw new Error("DATABASE_URL is not set.");
const { db, sql } = openDatabase(url, { max: 4 });
try {
  await ensureLibrary(db);
  await seed(db, new Date());
} finally {
  await sql.end();
}
