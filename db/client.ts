import { drizzle } from "drizzle-orm/postgres-js";
import postgres from "postgres";
import * as schema from "./schema";

/** Opens a pool; the caller closes it with `sql.end()`. */
export function openDatabase(url: string, options: { max?: number } = {}) {
  const sql = postgres(url, { max: options.max ?? 10, onnotice: () => undefined });
  return { sql, db: drizzle(sql, { schema, casing: "snake_case" }) };
}

export type Database = ReturnType<typeof openDatabase>["db"];
export type Transaction = Parameters<Parameters<Database["transaction"]>[0]>[0];
/** A database or a transaction on it: what every query takes first. */
export type Tx = Database | Transaction;
