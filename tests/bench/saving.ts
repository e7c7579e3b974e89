import { randomUUID } from "node:crypto";
import { performance } from "node:perf_hooks";
import { openDatabase } from "@/db/client";
import { createCamp } from "@/lib/services/camps/create";
import { readCamp } from "@/lib/services/camps/read";
import { saveChange } from "@/lib/services/camps/save-change";
import { campForm } from "../factories/camp-book";
import { teamWithEveryRole } from "../factories/team";
import { figures, round } from "./measure";

const CAMPS = 20;
const ROUNDS = 12;

/**
 * Saves of a moved sparring day: transaction with lock, plan, revision, mail job, on a loopback PostgreSQL that syncs to
 * disk. First one after another, then 20 at once, each on a camp of its own.
 */
export async function benchSaving(url: string) {
  const { db, sql } = openDatabase(url, { max: CAMPS });
  const now = new Date("2026-11-20T12:00:00Z");
  const { as } = await teamWithEveryRole(db, now);
  const ctx = as("head");
  const camps = await Promise.all(
    Array.from({ length: CAMPS }, (_, n) =>
      createCamp(ctx, { body: campForm({ athlete: { name: `Bench ${n}` } }) }),
    ),
  );
  const state = await Promise.all(
    camps.map(async ({ id }) => {
      const view = await readCamp(ctx, { params: { id } });
      const spar = view.sport.find((session) => session.id.endsWith("@2026-12-08"));
      return { id, sportId: spar?.id ?? "", revision: view.revision };
    }),
  );
  let errors = 0;
  const save = async (camp: (typeof state)[number], round: number): Promise<number> => {
    const start = performance.now();
    const date = round % 2 === 0 ? "2026-12-09" : "2026-12-08";
    const answer = await saveChange(ctx, {
      params: { id: camp.id },
      body: {
        change: {
          kind: "sport.edit",
          sportId: camp.sportId,
          scope: "this",
          values: { date, start: "18:00" },
        },
        baseRevision: camp.revision,
        idempotencyKey: randomUUID(),
      },
    }).catch(() => null);
    if (answer) camp.revision = answer.revision;
    else errors++;
    return performance.now() - start;
  };
  const alone: number[] = [];
  const together: number[] = [];
  for (let round = 0; round < 2; round++) for (const camp of state) await save(camp, round);
  for (let round = 0; round < ROUNDS; round++) for (const camp of state) alone.push(await save(camp, round));
  for (let round = 0; round < ROUNDS; round++)
    together.push(...(await Promise.all(state.map((camp) => save(camp, round)))));
  await sql.end();
  const [one, many] = [figures(alone), figures(together)];
  return {
    "save, one after another, ms": { median: round(one.median), p95: round(one.p95), runs: one.runs },
    "save, 20 at once on different camps, ms": {
      median: round(many.median),
      p95: round(many.p95),
      runs: many.runs,
    },
    errors: errors,
  };
}
