import { sql } from "drizzle-orm";
import { readFileSync } from "node:fs";
import postgres from "postgres";
import { describe, expect, it } from "vitest";
import { migrateDatabase } from "@/db/migrate.mjs";
import { teams } from "@/db/schema";
import { takeConsole } from "./quiet-console";
import { testDatabase } from "./database";
import { emptyDatabase } from "./template";

const { db, url } = await testDatabase();

describe("the database of a test file", () => {
  it("has the newest schema and nobody's rows", async () => {
    expect(await db.select().from(teams)).toEqual([]);
  });

  it("has the job queue, so that services can add jobs", async () => {
    const rows = await db.execute(sql`select attempts from graphile_worker.add_job('nothing')`);
    expect(rows[0]).toEqual({ attempts: 0 });
  });

  it("is what the settings of this process name", () => {
    expect(process.env.DATABASE_URL).toBe(url);
  });
});

describe("migrations", () => {
  it("run from zero, by two processes at once, each exactly once", async () => {
    const empty = await emptyDatabase();
    await Promise.all([migrateDatabase(empty.url), migrateDatabase(empty.url)]);
    await migrateDatabase(empty.url);
    const client = postgres(empty.url, { max: 1 });
    const rows = await client`select count(*)::int as n from drizzle.__drizzle_migrations`;
    await client.end();
    await empty.drop();
    const journal: { entries: unknown[] } = JSON.parse(readFileSync("drizzle/meta/_journal.json", "utf8"));
    expect(rows[0]?.n).toBe(journal.entries.length);
  });
});

describe("the console", () => {
  it("keeps what a test prints until the test takes it", () => {
    console.warn("expected", 1);
    expect(takeConsole()).toEqual(["console.warn: expected 1"]);
  });
});
