import { sql } from "drizzle-orm";
import { pgEnum, timestamp, uuid } from "drizzle-orm/pg-core";

/** Instants are UTC; the server and the cluster run in UTC. */
export const instant = () => timestamp({ withTimezone: true, mode: "date" });

export const id = () =>
  uuid()
    .primaryKey()
    .default(sql`gen_random_uuid()`);

export const createdAt = () => instant().notNull().defaultNow();

export const unitsEnum = pgEnum("units", ["kg", "lb"]);
