import { performance } from "node:perf_hooks";
import { drizzle } from "drizzle-orm/postgres-js";
import { openDatabase } from "@/db/client";
import * as schema from "@/db/schema";
import { readBoard } from "@/lib/services/board/read-board";
import { figures, round, timedAsync } from "./measure";
import { seedSeason } from "./season";

const RUNS = 200;
const WARM_UP = 20;

/** `/board` of 200 athletes in camp over a season of 500,000 logged rows. Limits: 60 ms at the 95th percentile, 8 queries. */
export async function benchBoard(url: string) {
  const { db, sql } = openDatabase(url);
  try {
    const seeding = performance.now();
    const { ctx, rows } = await seedSeason(db);
    const seeded = performance.now() - seeding;
    let queries = 0;
    const counted = drizzle(sql, {
      schema,
      casing: "snake_case",
      logger: { logQuery: () => void queries++ },
    });
    const board = await readBoard({ ...ctx, db: counted });
    const cpu = process.cpuUsage();
    const times = figures(await timedAsync(RUNS, WARM_UP, async () => void (await readBoard(ctx))));
    const used = process.cpuUsage(cpu);
    return {
      "of it in this process, ms": round((used.user + used.system) / 1000 / (RUNS + WARM_UP)),
      "rows logged": rows,
      "athletes on the board": board.rows.length,
      "flags in all": board.rows.reduce((sum, row) => sum + row.flags.length, 0),
      "queries (limit 8)": queries,
      "board, ms (limit 60 at p95)": { median: round(times.median), p95: round(times.p95), runs: times.runs },
      "answer, kB": round(JSON.stringify(board).length / 1000),
      "seeding, s": round(seeded / 1000),
    };
  } finally {
    await sql.end();
  }
}
