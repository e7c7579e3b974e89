import { RateLimiterPostgres } from "rate-limiter-flexible";
import { getTableName } from "drizzle-orm";
import type { Database } from "../client";
import { rateLimits } from "../schema";

export interface RateLimit {
  readonly name: string;
  readonly points: number;
  readonly seconds: number;
}

/** What the limiter needs of a PostgreSQL client, answered by postgres.js. */
const clientOf = (db: Database) => ({
  query: async ({ text, values }: { text: string; values: (string | number | null)[] }) => {
    const rows = await db.$client.unsafe(text, values);
    return { rows: rows.map((row) => ({ ...row, expire: Number(row.expire) })), rowCount: rows.count };
  },
});

const made = new WeakMap<Database, Map<string, RateLimiterPostgres>>();

/** The limiter of that name on that database; made once, since each sweeps expired rows by itself. */
export function rateLimiter(db: Database, { name, points, seconds }: RateLimit): RateLimiterPostgres {
  const ofDatabase = made.get(db) ?? new Map<string, RateLimiterPostgres>();
  made.set(db, ofDatabase);
  const known = ofDatabase.get(name);
  if (known) return known;
  const limiter = new RateLimiterPostgres({
    storeClient: clientOf(db),
    storeType: "client",
    tableName: getTableName(rateLimits),
    tableCreated: true,
    keyPrefix: name,
    points,
    duration: seconds,
  });
  ofDatabase.set(name, limiter);
  return limiter;
}
