import { and, asc, count, desc, eq, gt, gte, isNull, lt, or, sql } from "drizzle-orm";
import type { Tx } from "../client";
import { athletes, camps, feeds, memberships, sessions, teams } from "../schema";

export type FeedRow = typeof feeds.$inferSelect;

/** What a feed reaches back to. */
export interface FeedWindow {
  /** First bout date of the camps that are shown, YYYY-MM-DD. */
  readonly boutsFrom: string;
  /** Cancelled sessions are shown where they were cancelled after this. */
  readonly cancelledAfter: Date;
}

/** Camps that a feed shows. */
const shown = ({ boutsFrom }: FeedWindow) =>
  and(
    eq(camps.teamId, feeds.teamId),
    or(eq(feeds.scope, "team"), eq(camps.athleteId, feeds.athleteId)),
    gte(camps.boutDate, boutsFrom),
  );

/**
 * The feed behind a token that is not revoked, its owner's membership as it is now, and a fingerprint of all that the
 * calendar would show: camps with their revisions and athletes' names, and how many cancelled sessions are still shown.
 * One statement, because most readings end here.
 */
export async function findFeedByToken(tx: Tx, tokenHash: string, window: FeedWindow) {
  const state = tx
    .select({
      text: sql<
        string | null
      >`string_agg(concat(${camps.id}, ':', ${camps.revision}, ':', ${athletes.name}), ';' order by ${camps.id})`.as(
        "state_text",
      ),
    })
    .from(camps)
    .innerJoin(athletes, eq(athletes.id, camps.athleteId))
    .where(shown(window));
  const cancelled = tx
    .select({ n: count().as("cancelled_n") })
    .from(sessions)
    .innerJoin(camps, eq(camps.id, sessions.campId))
    .where(
      and(shown(window), eq(sessions.status, "cancelled"), gt(sessions.changedAt, window.cancelledAfter)),
    );
  const [row] = await tx
    .select({
      id: feeds.id,
      teamId: feeds.teamId,
      scope: feeds.scope,
      athleteId: feeds.athleteId,
      discreet: feeds.discreet,
      lastReadAt: feeds.lastReadAt,
      teamName: teams.name,
      athleteName: athletes.name,
      role: memberships.role,
      memberAthleteId: memberships.athleteId,
      state: sql<string | null>`(${state})`,
      cancelled: sql<string>`(${cancelled})`,
    })
    .from(feeds)
    .innerJoin(teams, eq(teams.id, feeds.teamId))
    .leftJoin(athletes, eq(athletes.id, feeds.athleteId))
    .innerJoin(memberships, and(eq(memberships.teamId, feeds.teamId), eq(memberships.userId, feeds.userId)))
    .where(and(eq(feeds.tokenHash, tokenHash), isNull(feeds.revokedAt)));
  return row ?? null;
}
export type ReadableFeed = NonNullable<Awaited<ReturnType<typeof findFeedByToken>>>;

/** Sessions of the camps that a feed shows, in order. */
export async function listFeedSessions(tx: Tx, teamId: string, feedId: string, window: FeedWindow) {
  return tx
    .select({
      session: sessions,
      athlete: { id: athletes.id, name: athletes.name },
      boutZone: camps.boutZone,
    })
    .from(feeds)
    .innerJoin(camps, shown(window))
    .innerJoin(athletes, eq(athletes.id, camps.athleteId))
    .innerJoin(sessions, and(eq(sessions.teamId, camps.teamId), eq(sessions.campId, camps.id)))
    .where(
      and(
        eq(feeds.teamId, teamId),
        eq(feeds.id, feedId),
        or(eq(sessions.status, "confirmed"), gt(sessions.changedAt, window.cancelledAfter)),
      ),
    )
    .orderBy(asc(sessions.startsAt), asc(sessions.uid));
}

/** Notes a reading, but no more often than `unlessAfter` says: a calendar that asks each minute costs no write each minute. */
export async function markFeedRead(
  tx: Tx,
  teamId: string,
  feedId: string,
  now: Date,
  unlessAfter: Date,
): Promise<void> {
  await tx
    .update(feeds)
    .set({ lastReadAt: now })
    .where(
      and(
        eq(feeds.teamId, teamId),
        eq(feeds.id, feedId),
        or(isNull(feeds.lastReadAt), lt(feeds.lastReadAt, unlessAfter)),
      ),
    );
}

const ofUser = (teamId: string, userId: string) =>
  and(eq(feeds.teamId, teamId), eq(feeds.userId, userId), isNull(feeds.revokedAt));

const withAthlete = { feed: feeds, athlete: { id: athletes.id, name: athletes.name } };

/** A person's subscriptions that are not revoked, newest first. */
export async function listFeedsOf(tx: Tx, teamId: string, userId: string) {
  return tx
    .select(withAthlete)
    .from(feeds)
    .leftJoin(athletes, eq(athletes.id, feeds.athleteId))
    .where(ofUser(teamId, userId))
    .orderBy(desc(feeds.createdAt), asc(feeds.id));
}

/** One of them; locked, so that renewing and revoking wait for each other. */
export async function lockFeedOf(tx: Tx, teamId: string, userId: string, feedId: string) {
  const [row] = await tx
    .select(withAthlete)
    .from(feeds)
    .leftJoin(athletes, eq(athletes.id, feeds.athleteId))
    .where(and(ofUser(teamId, userId), eq(feeds.id, feedId)))
    .for("update", { of: feeds });
  return row ?? null;
}

export async function countFeedsOf(tx: Tx, teamId: string, userId: string): Promise<number> {
  const [row] = await tx.select({ n: count() }).from(feeds).where(ofUser(teamId, userId));
  return row?.n ?? 0;
}

export async function insertFeed(
  tx: Tx,
  teamId: string,
  values: Pick<FeedRow, "userId" | "scope" | "athleteId" | "discreet" | "tokenHash" | "createdAt">,
): Promise<FeedRow> {
  const [row] = await tx
    .insert(feeds)
    .values({ teamId, ...values })
    .returning();
  if (!row) throw new Error("Insert returned no row.");
  return row;
}

/** A new address: the old one is gone, and nobody has read the new one yet. */
export async function replaceFeedToken(
  tx: Tx,
  teamId: string,
  feedId: string,
  tokenHash: string,
): Promise<void> {
  await tx
    .update(feeds)
    .set({ tokenHash, lastReadAt: null })
    .where(and(eq(feeds.teamId, teamId), eq(feeds.id, feedId)));
}

export async function revokeFeedRow(tx: Tx, teamId: string, feedId: string, now: Date): Promise<void> {
  await tx
    .update(feeds)
    .set({ revokedAt: now })
    .where(and(eq(feeds.teamId, teamId), eq(feeds.id, feedId)));
}
