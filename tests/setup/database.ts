import { afterAll } from "vitest";
import { openDatabase, type Database } from "@/db/client";
import { cloneDatabase } from "./template";

export interface TestDatabase {
  readonly db: Database;
  readonly sql: ReturnType<typeof openDatabase>["sql"];
  readonly url: string;
}

/**
 * A migrated, empty PostgreSQL database for one test file; gone after its last test.
 * Call it at the top of the file: `const { db } = await testDatabase();`. It also sets `DATABASE_URL`, so that code that
 * opens its own connection through `env()` meets the same database.
 */
export async function testDatabase(): Promise<TestDatabase> {
  const { url, drop } = await cloneDatabase();
  process.env.DATABASE_URL = url;
  const { db, sql } = openDatabase(url, { max: 5 });
  afterAll(async () => {
    await sql.end({ timeout: 5 });
    await drop();
  });
  return { db, sql, url };
}
