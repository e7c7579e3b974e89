// Brings a database to the newest schema: our tables (drizzle/) and the job queue's. Harmless when there is nothing to do.
//   node db/migrate.mjs [postgres://…]     without an address: DATABASE_URL
import path from "node:path";
import { fileURLToPath } from "node:url";
import { drizzle } from "drizzle-orm/postgres-js";
import { migrate } from "drizzle-orm/postgres-js/migrator";
import { Logger, runMigrations } from "graphile-worker";
import postgres from "postgres";
import { explain, runMain, SetupError } from "../lib/run/command.mjs";

const FOLDER = path.resolve(import.meta.dirname, "..", "drizzle");
// Any fixed number does, as long as every server process of one database uses the same.
const ADVISORY_LOCK = 7_235_001;

/**
 * Migrates the database behind `url`. Several processes may call it at once: one works, the others wait and find nothing to do.
 * @param {string} url
 * @returns {Promise<void>}
 */
export async function migrateDatabase(url) {
  const options = { max: 1, onnotice: () => undefined, connect_timeout: 10 };
  const guard = postgres(url, options);
  const client = postgres(url, options);
  try {
    // On a session of its own: the lock ends with that session, whatever happens to the work.
    await guard`select pg_advisory_lock(${ADVISORY_LOCK})`;
    await migrate(drizzle(client), { migrationsFolder: FOLDER });
    await runMigrations({ connectionString: url, logger: new Logger(() => () => undefined) });
  } finally {
    await Promise.all([client.end({ timeout: 5 }), guard.end({ timeout: 5 })]);
  }
}

if (process.argv[1] === fileURLToPath(import.meta.url)) {
  await runMain(async () => {
    const url = process.argv[2] ?? process.env.DATABASE_URL;
    if (!url) throw new SetupError("which database? Give its address or set DATABASE_URL");
    await migrateDatabase(url).catch((error) => {
      throw new SetupError(
        `the database could not be migrated: ${explain(String(error.cause?.message ?? error.message))}`,
      );
    });
  });
}
