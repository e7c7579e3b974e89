import { env } from "../lib/env";
import { openDatabase, type Database } from "./client";

// One pool a process and address, kept across hot reloads in development.
const holder = globalThis as typeof globalThis & { bellwardPool?: { url: string; db: Database } };

/** The process's pool; opened at first use, so that a build needs no database. */
export function database(): Database {
  const url = env().DATABASE_URL;
  if (holder.bellwardPool?.url !== url) holder.bellwardPool = { url, db: openDatabase(url, { max: 10 }).db };
  return holder.bellwardPool.db;
}
