import { afterEach, beforeEach, expect, it } from "vitest";
import { GET } from "@/app/api/health/route";
import { openDatabase } from "@/db/client";
import { checkHealth } from "@/lib/services/health/check";
import { testDatabase } from "../setup/database";

const { sql } = await testDatabase();
const health = async () => {
  const response = await GET();
  return { status: response.status, body: (await response.json()) as Record<string, unknown> };
};

beforeEach(() => {
  globalThis.bellwardMailWorker = { runs: () => true, stop: async () => undefined };
});
afterEach(() => {
  delete globalThis.bellwardMailWorker;
});

it("says 200 with every part up, and the version", async () => {
  const { status, body } = await health();
  expect(status).toBe(200);
  expect(body).toEqual({
    status: "up",
    version: expect.stringMatching(/^\d+\.\d+\.\d+/),
    database: "up",
    migrations: "up",
    mailQueue: "up",
    mail: { waiting: 0, failed: 0 },
  });
});

it("says 503 and which part is down where the mail queue does not work", async () => {
  globalThis.bellwardMailWorker = { runs: () => false, stop: async () => undefined };
  expect(await health()).toMatchObject({
    status: 503,
    body: { database: "up", migrations: "up", mailQueue: "down" },
  });
});

it("says 503 where a migration of this build is missing, and 200 where the database is newer", async () => {
  const [last] =
    await sql`select id, created_at from drizzle.__drizzle_migrations order by created_at desc limit 1`;
  await sql`delete from drizzle.__drizzle_migrations where id = ${last?.id}`;
  expect(await health()).toMatchObject({ status: 503, body: { database: "up", migrations: "down" } });
  await sql`insert into drizzle.__drizzle_migrations (hash, created_at) values ('later', ${Number(last?.created_at) + 1})`;
  expect((await health()).status).toBe(200);
});

it("is down with all that stands on it where the database does not answer, and tells nothing of its address", async () => {
  // Port 9 refuses.
  const { db, sql: none } = openDatabase("postgres://secret-user@127.0.0.1:9/secret-name");
  const down = await checkHealth(db);
  expect(down).toMatchObject({
    ok: false,
    database: "down",
    migrations: "down",
    mailQueue: "down",
    mail: null,
  });
  expect(JSON.stringify(down)).not.toContain("secret");
  await none.end({ timeout: 1 });
});
