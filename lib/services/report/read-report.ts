import { listRevisions } from "@/db/queries/camps";
import { findAthlete } from "@/db/queries/athletes";
import { listAnswered } from "@/db/queries/report";
import { listNewestOfTeam, listTrials } from "@/db/queries/tests";
import { findUser } from "@/db/queries/users";
import { listWeights } from "@/db/queries/weights";
import { campSpan } from "@/lib/book";
import { MINOR_WORDS, isoFromDay } from "@/lib/engine";
import type { Day } from "@/lib/engine/types";
import { AppError } from "@/lib/errors";
import { can, type Action } from "@/lib/policy";
import type { ReportTest, ReportView, ReportWeight } from "@/lib/schemas/report";
import { isMinor } from "@/lib/services/athletes/age";
import { loadCamp, type LoadedCamp } from "@/lib/services/camps/load";
import type { TeamContext } from "@/lib/services/context";
import { summarise } from "@/lib/services/tests/summary";
import { attendanceOf, hardRoundsOf, weeksOf } from "./planned-done";
import { standDownOf } from "./stand-down";

/** Tests of so many days before the camp still say where it started, and of so many after the bout where it ended. */
const TESTS_AROUND_DAYS = 14;
/** Weights of so many days before the camp still say where it started. */
const WEIGHTS_BEFORE_DAYS = 7;

/** True from the bout's start on. */
export const boutIsOver = (camp: LoadedCamp, now: Date): boolean =>
  camp.sessions.some((session) => session.source === "bout" && session.startsAt <= now);

const around = ({ book }: LoadedCamp, before: number, after: number) => {
  const { from, to } = campSpan(book);
  return { from: isoFromDay((from - before) as Day), to: isoFromDay((to + after) as Day) };
};

async function testsOf(ctx: TeamContext, camp: LoadedCamp): Promise<ReportTest[]> {
  const { from, to } = around(camp, TESTS_AROUND_DAYS, TESTS_AROUND_DAYS);
  const [trials, people] = await Promise.all([
    listTrials(ctx.db, ctx.teamId, camp.athlete.id),
    listNewestOfTeam(ctx.db, ctx.teamId),
  ]);
  const { series } = summarise(
    trials.filter(({ day }) => day >= from && day <= to),
    people,
    new Map(),
  );
  return series.flatMap(({ key, measure, side, verdict, error }) =>
    verdict
      ? [{ key, title: side === "both" ? measure : `${measure}, ${side}`, verdict, errorText: error.text }]
      : [],
  );
}

async function weightOf(ctx: TeamContext, camp: LoadedCamp): Promise<ReportWeight | { off: string }> {
  const athlete = await findAthlete(ctx.db, ctx.teamId, camp.athlete.id);
  const days = around(camp, WEIGHTS_BEFORE_DAYS, 0);
  if (isMinor(athlete?.dateOfBirth ?? null, days.to)) return { off: MINOR_WORDS };
  const rows = await listWeights(ctx.db, ctx.teamId, camp.athlete.id, days);
  return { limitKg: camp.book.bout.limitKg, points: rows.map(({ day, kg }) => ({ date: day, kg })) };
}

/** What a camp did: planned against done, tests first to last, weight, changes, result. Throws `forbidden` for a guest. */
export async function readReport(
  ctx: TeamContext,
  { params }: { params: Record<string, string> },
): Promise<ReportView> {
  const camp = await loadCamp(ctx.db, ctx, params.id ?? "");
  const { athlete, book, row, plan } = camp;
  const sees = (action: Action): boolean => can(ctx.member, action, athlete.id);
  if (!sees("report.read")) throw new AppError("forbidden", "Your role may not do this.");
  const [user, answered, tests, weight, changes] = await Promise.all([
    findUser(ctx.db, ctx.userId),
    sees("logs.read") ? listAnswered(ctx.db, ctx.teamId, row.id) : null,
    sees("tests.read") ? testsOf(ctx, camp) : null,
    sees("weight.read") ? weightOf(ctx, camp) : null,
    sees("camps.history") ? listRevisions(ctx.db, ctx.teamId, row.id) : null,
  ]);
  const days = row.result?.standDownDays ?? 0;
  return {
    campId: row.id,
    athlete,
    bout: {
      date: book.bout.date,
      place: book.bout.place,
      opponent: book.bout.opponent,
      ruleset: book.bout.ruleset,
    },
    zone: book.homeZone,
    weeks: book.weeks,
    off: book.status === "off",
    over: boutIsOver(camp, ctx.now) || book.status === "off",
    result: row.result,
    standDown: days > 0 ? standDownOf(book.bout.date, days) : null,
    unit: user?.units ?? "kg",
    attendance: answered && attendanceOf(answered, ctx.now),
    hardRounds: answered && hardRoundsOf(answered),
    byWeek: answered && weeksOf(answered, plan),
    tests,
    weight,
    changes:
      changes &&
      changes.map(({ number, at, by, summary }) => ({
        number,
        at: at.toISOString(),
        by: by ?? "Someone who left the team",
        summary,
      })),
    may: { record: sees("result.write") },
  };
}
