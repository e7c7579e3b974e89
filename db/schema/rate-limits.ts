import { bigint, index, integer, pgTable, varchar } from "drizzle-orm/pg-core";

/** Tries in a span of time, shared by all server processes. The order of the columns is what rate-limiter-flexible inserts by. */
export const rateLimits = pgTable(
  "rate_limits",
  {
    /** Name of the limit and a hash of whom it counts: no address or e-mail stands here. */
    key: varchar({ length: 255 }).primaryKey(),
    points: integer().notNull().default(0),
    /** Milliseconds since 1970. */
    expire: bigint({ mode: "number" }),
  },
  (t) => [index("rate_limits_expire").on(t.expire)],
);
