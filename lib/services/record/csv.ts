import { listDayLoads } from "@/db/queries/athlete-record";
import { listCheckIns } from "@/db/queries/check-ins";
import { listExercises } from "@/db/queries/exercises";
import { listBests } from "@/db/queries/prescription";
import { listTrials } from "@/db/queries/tests";
import { findUser } from "@/db/queries/users";
import { listWeights } from "@/db/queries/weights";
import { MINOR_WORDS, TEST_KINDS, TEST_SPECS, dayFromIso, isoFromDay } from "@/lib/engine";
import { AppError, notFound } from "@/lib/errors";
import { csvText, type CsvCell } from "@/lib/format/csv";
import { fromKg, type MassUnit } from "@/lib/format/load";
import { can, type Action } from "@/lib/policy";
import { CSV_KINDS, type CsvKind } from "@/lib/schemas/athlete-record";
import type { TeamContext } from "@/lib/services/context";
import { athleteFor, type AthleteNow } from "@/lib/services/today/athlete-day";
import { loadDaysOf } from "./load-record";

/** Who may see what a file holds. */
const MAY: Readonly<Record<CsvKind, Action>> = {
  tests: "tests.read",
  bests: "tests.read",
  weights: "weight.read",
  "check-ins": "checkins.read",
  load: "logs.read",
};

interface Sheet {
  readonly head: readonly string[];
  readonly rows: readonly (readonly CsvCell[])[];
}

interface Asked {
  readonly ctx: TeamContext;
  readonly now: AthleteNow;
  readonly unit: MassUnit;
}

const EVER = "0001-01-01";

async function tests({ ctx, now, unit }: Asked): Promise<Sheet> {
  const rows = await listTrials(ctx.db, ctx.teamId, now.athlete.id);
  const masses = can(ctx.member, "weight.read", now.athlete.id);
  return {
    // The columns of the template: what was exported can be imported again.
    head: [
      "Date",
      "Test",
      "Side",
      "Value",
      "Second",
      `Body mass ${unit}`,
      "Note",
      "Value unit",
      "Second unit",
    ],
    rows: rows.map(({ day, kind, side, value, second, massKg, note }) => {
      const spec = TEST_SPECS[TEST_KINDS.find((known) => known === kind) ?? "jump-height"];
      const inKg = spec.second?.unit === "kg";
      return [
        day,
        spec.title,
        side,
        value,
        second === null ? null : inKg ? fromKg(second, unit) : second,
        massKg === null || !masses ? null : fromKg(massKg, unit),
        note,
        spec.value.unit,
        second === null ? null : inKg ? unit : (spec.second?.unit ?? null),
      ];
    }),
  };
}

async function weights({ ctx, now, unit }: Asked): Promise<Sheet> {
  if (now.minor) throw new AppError("conflict", MINOR_WORDS);
  const rows = await listWeights(ctx.db, ctx.teamId, now.athlete.id, {
    from: EVER,
    to: isoFromDay(now.today),
  });
  return { head: ["Date", `Weight ${unit}`], rows: rows.map(({ day, kg }) => [day, fromKg(kg, unit)]) };
}

async function checkIns({ ctx, now }: Asked): Promise<Sheet> {
  const rows = await listCheckIns(ctx.db, ctx.teamId, now.athlete.id, {
    from: EVER,
    to: isoFromDay(now.today),
  });
  return {
    head: ["Date", "Sleep (1 very good, 7 very poor)", "Fatigue", "Soreness", "Stress"],
    rows: rows.map(({ day, sleep, fatigue, soreness, stress }) => [day, sleep, fatigue, soreness, stress]),
  };
}

async function load({ ctx, now }: Asked): Promise<Sheet> {
  const rows = await listDayLoads(ctx.db, ctx.teamId, now.athlete.id, {
    from: EVER,
    to: isoFromDay(now.today),
  });
  const first = rows[0];
  const days = first ? loadDaysOf(rows, dayFromIso(first.day), now.today) : [];
  return {
    head: ["Date", "Planned sport AU", "Planned lifting AU", "Done sport AU", "Done lifting AU"],
    rows: days.map((day) => [day.date, day.plannedSport, day.plannedLifting, day.doneSport, day.doneLifting]),
  };
}

async function bests({ ctx, now, unit }: Asked): Promise<Sheet> {
  const [rows, exercises] = await Promise.all([
    listBests(ctx.db, ctx.teamId, now.athlete.id),
    listExercises(ctx.db, ctx.teamId),
  ]);
  const names = new Map(exercises.map(({ exercise }) => [exercise.id, exercise.name]));
  return {
    head: ["Date", "Exercise", `Lifted ${unit}`, "Repetitions", "Formula", `Best ${unit}`],
    rows: rows.map(({ day, exerciseId, liftedKg, reps, formula, kg }) => [
      day,
      names.get(exerciseId) ?? exerciseId,
      fromKg(liftedKg, unit),
      reps,
      formula ?? "measured",
      fromKg(kg, unit),
    ]),
  };
}

const SHEETS: Readonly<Record<CsvKind, (asked: Asked) => Promise<Sheet>>> = {
  tests,
  weights,
  "check-ins": checkIns,
  load,
  bests,
};

/**
 * One kind of an athlete's data as a CSV file, all days there are, masses in the reader's unit. Weights of a minor are refused
 * (409). Throws `not-found` for another kind.
 */
export async function exportCsv(
  ctx: TeamContext,
  { params }: { params: Record<string, string> },
): Promise<{ readonly name: string; readonly text: string }> {
  const what = CSV_KINDS.find((kind) => kind === params.what);
  if (!what) throw notFound();
  const now = await athleteFor(ctx.db, ctx, params.id, MAY[what]);
  const user = await findUser(ctx.db, ctx.userId);
  const { head, rows } = await SHEETS[what]({ ctx, now, unit: user?.units ?? "kg" });
  return { name: `${now.athlete.name} ${what} ${isoFromDay(now.today)}`, text: csvText(head, rows) };
}
