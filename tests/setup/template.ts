import { createHash } from "node:crypto";
import { mkdirSync, readdirSync, readFileSync, rmSync, writeFileSync } from "node:fs";
import path from "node:path";
import postgres from "postgres";
import { migrateDatabase } from "@/db/migrate.mjs";
import { clusterRuns, clusterUrl, startCluster, stopCluster } from "@/db/server.mjs";
import { isAlive, withLock } from "@/db/server-ports.mjs";
import { openDatabase } from "@/db/client";
import { ensureLibrary } from "@/lib/services/exercises/library";

const ROOT = path.resolve(import.meta.dirname, "../..");
/** The tests' own cluster: without fsync, and apart from the one `npm start` uses. */
export const TEST_CLUSTER = path.join(ROOT, ".data", "test-pg");
const FRESH = "fresh_template";

/** A template's name changes with whatever made it, so that an old one is never taken for a new one. */
function templateName(): string {
  const hash = createHash("sha256");
  const files = [
    "db/migrate.mjs",
    "package-lock.json",
    ...["drizzle", "db/seed/exercises"].flatMap((folder) =>
      readdirSync(path.join(ROOT, folder)).map((file) => `${folder}/${file}`),
    ),
  ];
  for (const file of files.filter((name) => /\.(mjs|json|sql|ts)$/.test(name)).sort()) {
    hash.update(file).update(readFileSync(path.join(ROOT, file)));
  }
  return `template_${hash.digest("hex").slice(0, 16)}`;
}

const withDatabase = (url: string, database: string): string => {
  const changed = new URL(url);
  changed.pathname = `/${database}`;
  return changed.href;
};

async function asOwner<T>(url: string, work: (sql: postgres.Sql) => Promise<T>): Promise<T> {
  const sql = postgres(withDatabase(url, "postgres"), { max: 1, onnotice: () => undefined });
  try {
    return await work(sql);
  } finally {
    await sql.end();
  }
}

/** The exercise library, as every server process brings it at its start. */
async function fillLibrary(url: string): Promise<void> {
  const { db, sql } = openDatabase(url, { max: 1 });
  try {
    await ensureLibrary(db);
  } finally {
    await sql.end();
  }
}

/** Migrates the template once for all processes; others wait for the one that does. */
async function ensureTemplate(url: string): Promise<string> {
  const name = templateName();
  const exists = () => asOwner(url, (sql) => sql`select 1 from pg_database where datname = ${name}`);
  if ((await exists()).length > 0) return name;
  return withLock(path.join(TEST_CLUSTER, "template.lock"), async () => {
    if ((await exists()).length > 0) return name;
    await asOwner(url, async (sql) => {
      await sql`drop database if exists ${sql(FRESH)} with (force)`;
      await sql`create database ${sql(FRESH)}`;
      await migrateDatabase(withDatabase(url, FRESH));
      await fillLibrary(withDatabase(url, FRESH));
      await sql`alter database ${sql(FRESH)} rename to ${sql(name)}`;
    });
    return name;
  });
}

let serial = 0;

/** A new database of the newest schema, cloned from the template; `drop` takes it away, connections and all. */
export async function cloneDatabase(): Promise<{ url: string; drop: () => Promise<void> }> {
  const cluster = await startCluster({ dir: TEST_CLUSTER, fast: true });
  const template = await ensureTemplate(cluster.url);
  serial += 1;
  const name = `clone_${process.pid}_${serial}`;
  await asOwner(cluster.url, async (sql) => {
    await sql`drop database if exists ${sql(name)} with (force)`;
    await sql`create database ${sql(name)} template ${sql(template)}`;
  });
  return {
    url: withDatabase(cluster.url, name),
    drop: () =>
      asOwner(
        cluster.url,
        async (sql) => void (await sql`drop database if exists ${sql(name)} with (force)`),
      ),
  };
}

/** An empty database without any schema, for tests of the migrations themselves. */
export async function emptyDatabase(): Promise<{ url: string; drop: () => Promise<void> }> {
  const clone = await cloneDatabase();
  const name = new URL(clone.url).pathname.slice(1);
  await asOwner(clone.url, async (sql) => {
    await sql`drop database ${sql(name)} with (force)`;
    await sql`create database ${sql(name)}`;
  });
  return clone;
}

/** Drops what killed runs left behind: clones of dead processes and templates of older schemas. */
async function dropLeftovers(url: string): Promise<void> {
  const keep = templateName();
  await asOwner(url, async (sql) => {
    const rows = await sql<
      { datname: string }[]
    >`select datname from pg_database where datname ~ '^(clone|template)_'`;
    for (const { datname } of rows) {
      const owner = /^clone_(\d+)_/.exec(datname)?.[1];
      const dead = owner === undefined ? datname !== keep : !isAlive(Number(owner));
      if (dead) await sql`drop database if exists ${sql(datname)} with (force)`;
    }
  });
}

const USERS = path.join(TEST_CLUSTER, "users");

/**
 * Says that this process may use the tests' cluster, which starts when the first database is asked for. Several runs
 * share it; giving it back stops it when nobody else is left.
 */
export function holdTestCluster(): () => Promise<void> {
  const mine = path.join(USERS, String(process.pid));
  mkdirSync(USERS, { recursive: true });
  writeFileSync(mine, "");
  return async () => {
    rmSync(mine, { force: true });
    for (const pid of readdirSync(USERS))
      if (!isAlive(Number(pid))) rmSync(path.join(USERS, pid), { force: true });
    if (readdirSync(USERS).length > 0 || !clusterRuns({ dir: TEST_CLUSTER })) return;
    const url = clusterUrl({ dir: TEST_CLUSTER });
    if (url) await dropLeftovers(url);
    await stopCluster({ dir: TEST_CLUSTER });
  };
}
