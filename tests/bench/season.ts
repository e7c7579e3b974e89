import { eq, sql } from "drizzle-orm";
import type { Database } from "@/db/client";
import { athletes, camps } from "@/db/schema";
import { isoFromDay, weekdayOf } from "@/lib/engine";
import type { Day } from "@/lib/engine/types";
import type { TeamContext } from "@/lib/services/context";
import { createCamp } from "@/lib/services/camps/create";
import { campForm } from "../factories/camp-book";
import { teamWithEveryRole } from "../factories/team";

/** Athletes in camp, of so many camps that the engine laid out; the others are copies under another name. */
const ATHLETES = 200;
const LAID_OUT = 10;
/** Days of the season that lie behind, and rows that are logged in it. */
const SEASON_DAYS = 400;
const ROWS = 500_000;
/** The day it is: a Tuesday. */
export const SEASON_NOW = new Date("2026-12-01T12:00:00Z");
const TODAY = Math.floor(SEASON_NOW.getTime() / 86_400_000) as Day;

/** A camp of 5 to 12 weeks whose bout is `out` days ahead, its weekly sparring laid into it. */
async function layOut(db: Database, as: (at: Date) => TeamContext, index: number): Promise<string> {
  const boutDay = (TODAY + 3 + index * 5) as Day;
  const weeks = 5 + (index % 8);
  const first = (boutDay - 7 * weeks + 1) as Day;
  const on = (weekday: number): string => isoFromDay((first + ((weekday - weekdayOf(first) + 7) % 7)) as Day);
  const form = campForm();
  const { id } = await createCamp(as(new Date((first - 1) * 86_400_000)), {
    body: campForm({
      athlete: { name: `Season ${index}` },
      bout: { ...form.bout, date: isoFromDay(boutDay) },
      weighIn: { date: isoFromDay((boutDay - 1) as Day), time: "11:00" },
      weeks,
      sport: form.sport.map((entry, nth) => ({
        ...entry,
        start: `${on(nth === 0 ? 2 : nth === 1 ? 6 : 1)}T18:00`,
        rrule: `FREQ=WEEKLY;UNTIL=${isoFromDay((boutDay - 10) as Day).replaceAll("-", "")}T235900Z`,
      })),
    }),
  });
  const [row] = await db.select({ athleteId: camps.athleteId }).from(camps).where(eq(camps.id, id));
  if (!row) throw new Error("A camp that was laid out is gone.");
  await db
    .update(athletes)
    .set({ name: `Season ${String(index).padStart(3, "0")}` })
    .where(eq(athletes.id, row.athleteId));
  return id;
}

/**
 * A team with 200 athletes in camp and a season behind them: 500,000 rows over session_logs, logged_sets, check_ins and weights,
 * written by PostgreSQL itself. Invented numbers from a fixed seed, so that two runs hold the same.
 */
export async function seedSeason(db: Database): Promise<{ ctx: TeamContext; rows: number }> {
  const { team, as } = await teamWithEveryRole(db, SEASON_NOW);
  const laid: string[] = [];
  for (let index = 0; index < LAID_OUT; index++) laid.push(await layOut(db, (at) => as("head", at), index));
  const today = isoFromDay(TODAY);
  await db.transaction(async (tx) => {
    await tx.execute(sql`select setseed(0.42)`);
    // Copies of the camps that were laid out: one more athlete and camp each.
    await tx.execute(sql`create temp table copied on commit drop as
      select c.id as from_camp, gen_random_uuid() as camp, gen_random_uuid() as athlete, gen_random_uuid() as before, n
      from generate_series(1, ${ATHLETES / LAID_OUT - 1}) n, unnest(${sql.param(laid)}::uuid[]) as l(id) join camps c on c.id = l.id`);
    await tx.execute(sql`insert into athletes
      select (jsonb_populate_record(a, jsonb_build_object('id', k.athlete, 'name', a.name || ' ' || k.n))).*
      from copied k join camps c on c.id = k.from_camp join athletes a on a.id = c.athlete_id`);
    await tx.execute(sql`insert into camps
      select (jsonb_populate_record(c, jsonb_build_object('id', k.camp, 'athlete_id', k.athlete))).*
      from copied k join camps c on c.id = k.from_camp`);
    for (const table of ["sport_entries", "sessions"])
      await tx.execute(sql`insert into ${sql.identifier(table)}
        select (jsonb_populate_record(t, jsonb_build_object('camp_id', k.camp)
          || ${table === "sessions" ? sql`jsonb_build_object('uid', gen_random_uuid())` : sql`'{}'::jsonb`})).*
        from copied k join ${sql.identifier(table)} t on t.camp_id = k.from_camp`);
    // The season before: one long camp each, over, with a session on most days.
    await tx.execute(sql`create temp table past on commit drop as
      select c.id as now_camp, c.athlete_id as athlete, gen_random_uuid() as camp from camps c where c.team_id = ${team.id}`);
    await tx.execute(sql`insert into camps
      select (jsonb_populate_record(c, jsonb_build_object('id', p.camp, 'bout_date', date ${sql.raw(`'${today}'`)} - 90))).*
      from past p join camps c on c.id = p.now_camp`);
    await tx.execute(sql`insert into sessions (team_id, camp_id, id, source, kind, title, day, start, minutes, starts_at, ends_at,
        effort, changed_at)
      select ${team.id}, p.camp, 'old@' || d, (case when d % 2 = 0 then 'lift' else 'sport' end)::session_source,
        case when d % 2 = 0 then 'strength-a' else 'skill' end, 'Past work', date ${sql.raw(`'${today}'`)} - d, '18:00', 60,
        (date ${sql.raw(`'${today}'`)} - d) + time '18:00', (date ${sql.raw(`'${today}'`)} - d) + time '19:00', 6, now()
      from past p, generate_series(91, ${SEASON_DAYS}) d where d % 7 <> 0`);
    await tx.execute(sql`insert into session_logs (team_id, camp_id, athlete_id, session_id, day, state, effort, minutes, pain, pain_place,
        logged_at, changed_at)
      select s.team_id, s.camp_id, c.athlete_id, s.id, s.day, (case when r.chance < 0.93 then 'done' else 'missed' end)::log_state,
        case when r.chance < 0.93 then least(10, greatest(1, round(s.effort + (r.chance - 0.4) * 4))) end,
        case when r.chance < 0.93 then s.minutes end, case when r.chance > 0.9 and r.chance < 0.93 then 4 end,
        case when r.chance > 0.9 and r.chance < 0.93 then 'left knee' else '' end, s.ends_at, s.ends_at
      from (select s.*, random() as chance from sessions s where s.team_id = ${team.id} and s.day < ${today}
        and s.source in ('lift', 'sport') order by s.camp_id, s.id) r
      join sessions s on s.camp_id = r.camp_id and s.id = r.id join camps c on c.id = s.camp_id`);
    await tx.execute(sql`insert into check_ins
      select a.team_id, a.id, date ${sql.raw(`'${today}'`)} - d, 1 + floor(random() * 4), 1 + floor(random() * 4), 1 + floor(random() * 4),
        1 + floor(random() * 4), now()
      from athletes a, generate_series(0, ${SEASON_DAYS}) d where a.team_id = ${team.id} and a.id in (select athlete from past)`);
    await tx.execute(sql`insert into weights
      select a.team_id, a.id, date ${sql.raw(`'${today}'`)} - d, round((62 + d * 0.01 + random() * 1.5)::numeric, 1), now()
      from athletes a, generate_series(0, ${SEASON_DAYS}) d where a.team_id = ${team.id} and a.id in (select athlete from past)`);
    // Whatever is missing up to the number of rows is sets.
    await tx.execute(sql`insert into logged_sets (team_id, camp_id, athlete_id, session_id, slot, number, exercise_id, day, kg, reps, reserve)
      select l.team_id, l.camp_id, l.athlete_id, l.session_id, 'slot-' || (n / 4), 1 + n % 4, 'back-squat', l.day, 60 + n, 5, 2
      from session_logs l, generate_series(0, 19) n where l.team_id = ${team.id} and l.state = 'done'
      order by n, l.day desc limit ${ROWS} - (select count(*) from session_logs where team_id = ${team.id})
        - (select count(*) from check_ins where team_id = ${team.id}) - (select count(*) from weights where team_id = ${team.id})`);
  });
  // What a database does by itself in a quiet hour, so that it does not do it while it is measured.
  await db.execute(sql`vacuum analyze`);
  await db.execute(sql`checkpoint`);
  const [counted] = await db.execute<{ rows: number }>(
    sql`select (${sql.join(
      ["session_logs", "logged_sets", "check_ins", "weights"].map(
        (table) => sql`(select count(*) from ${sql.identifier(table)} where team_id = ${team.id})`,
      ),
      sql` + `,
    )})::int as rows`,
  );
  return { ctx: as("head"), rows: counted?.rows ?? 0 };
}
