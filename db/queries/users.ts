import { and, eq, sql } from "drizzle-orm";
import type { Tx } from "../client";
import { users } from "../schema";

export type UserRow = typeof users.$inferSelect;

/** A person by e-mail, whatever its case. Not scoped to a team: an account stands above teams. */
export async function findUserByEmail(tx: Tx, email: string): Promise<UserRow | null> {
  const [row] = await tx
    .select()
    .from(users)
    .where(eq(sql`lower(${users.email})`, email.toLowerCase()));
  return row ?? null;
}

export async function findUser(tx: Tx, userId: string): Promise<UserRow | null> {
  const [row] = await tx.select().from(users).where(eq(users.id, userId));
  return row ?? null;
}

type NewUser = Pick<
  typeof users.$inferInsert,
  "name" | "email" | "passwordHash" | "timeZone" | "currentTeamId" | "createdAt"
>;

/** Null where the e-mail is taken. */
export async function insertUser(tx: Tx, values: NewUser): Promise<UserRow | null> {
  const [row] = await tx.insert(users).values(values).onConflictDoNothing().returning();
  return row ?? null;
}

export async function updateUser(
  tx: Tx,
  userId: string,
  values: Partial<Pick<UserRow, "name" | "units" | "timeZone" | "mailChoice" | "currentTeamId">>,
): Promise<void> {
  await tx.update(users).set(values).where(eq(users.id, userId));
}

/** Gives a new password and ends all sessions. Returns the version that new sessions carry. */
export async function replacePassword(tx: Tx, userId: string, passwordHash: string): Promise<number> {
  const [row] = await tx
    .update(users)
    .set({ passwordHash, sessionVersion: sql`${users.sessionVersion} + 1` })
    .where(eq(users.id, userId))
    .returning({ version: users.sessionVersion });
  if (!row) throw new Error("Update of a person who is not there.");
  return row.version;
}

/** Ends all sessions of a person who was taken out of the team that they were in. */
export async function endSessions(tx: Tx, userId: string, teamId: string): Promise<void> {
  await tx
    .update(users)
    .set({ sessionVersion: sql`${users.sessionVersion} + 1` })
    .where(eq(users.id, userId));
  await tx
    .update(users)
    .set({ currentTeamId: null })
    .where(and(eq(users.id, userId), eq(users.currentTeamId, teamId)));
}
