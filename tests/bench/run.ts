import { execFileSync } from "node:child_process";
import { writeFileSync } from "node:fs";
import { cpus } from "node:os";
import { eq } from "drizzle-orm";
import { openDatabase } from "@/db/client";
import { athletes, camps } from "@/db/schema";
import { benchBoard } from "./board";
import { benchEngine } from "./engine";
import { benchFeed } from "./feed";
import { benchFirstLoad } from "./first-load";
import { benchPreview } from "./preview";
import { benchSaving } from "./saving";

const setting = (name: string): string => {
  const value = process.env[name];
  if (!value) throw new Error(`${name} is not set: run this by "npm run bench".`);
  return value;
};

const databaseUrl = setting("DATABASE_URL");
const url = setting("BENCH_URL");

async function campOfEightWeeks(): Promise<string> {
  const { db, sql } = openDatabase(databaseUrl, { max: 1 });
  const [row] = await db
    .select({ id: camps.id })
    .from(camps)
    .innerJoin(athletes, eq(athletes.id, camps.athleteId))
    .where(eq(camps.weeks, 8));
  await sql.end();
  if (!row) throw new Error("The demo has no 8-week camp.");
  return row.id;
}

const steps = {
  engine: benchEngine,
  preview: benchPreview,
  feed: () => benchFeed(url, databaseUrl),
  "first load": async () => benchFirstLoad(url, await campOfEightWeeks()),
  saving: () => benchSaving(databaseUrl),
  board: () => benchBoard(databaseUrl),
};

/** `npm run bench -- saving board` runs these alone and writes nothing. */
const wanted = process.argv.slice(2);
const results: Record<string, unknown> = {};
for (const [name, work] of Object.entries(steps)) {
  if (wanted.length > 0 && !wanted.includes(name)) continue;
  process.stdout.write(`${name} …\n`);
  results[name] = await work();
  process.stdout.write(`${JSON.stringify(results[name], null, 2)}\n`);
}
const report = {
  commit: execFileSync("git", ["rev-parse", "--short", "HEAD"], { encoding: "utf8" }).trim(),
  node: process.version,
  processor: `${cpus().length} x ${cpus()[0]?.model ?? "unknown"}`,
  ...results,
};
if (wanted.length === 0) writeFileSync("tests/bench/latest.json", `${JSON.stringify(report, null, 2)}\n`);
