import { readFileSync } from "node:fs";
import path from "node:path";
import { sql } from "drizzle-orm";
import type { Tx } from "../client";

/** Newest migration that this build knows: milliseconds, as drizzle writes them. */
function newestKnown(): number {
  const journal = path.join(process.cwd(), "drizzle", "meta", "_journal.json");
  const { entries } = JSON.parse(readFileSync(journal, "utf8")) as { entries: { when: number }[] };
  return Math.max(...entries.map((entry) => entry.when));
}

/** True where the database answers. */
export async function databaseAnswers(tx: Tx): Promise<boolean> {
  const rows = await tx.execute(sql`select 1 as one`);
  return rows.length === 1;
}

/** True where every migration of this build is in the database; a newer database is fine, migrations only widen. */
export async function isMigrated(tx: Tx): Promise<boolean> {
  const rows = await tx.execute<{ at: string }>(
    sql`select max(created_at)::text as at from drizzle.__drizzle_migrations`,
  );
  return Number(rows[0]?.at ?? 0) >= newestKnown();
}
