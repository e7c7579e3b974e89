import { and, asc, count, desc, eq, gt, gte, isNull, or, sql } from "drizzle-orm";
import type { Lift } from "../../lib/engine/types";
import type { Role } from "../../lib/policy/roles";
import type { Database, Tx } from "../client";
import { athletes, camps, feeds, sessions } from "../schema";

export type FeedRow = typeof feeds.$inferSelect;

/** What a feed reaches back to. */
export interface FeedWindow {
  /** First bout date of the camps that are shown, YYYY-MM-DD. */
  readonly boutsFrom: string;
  /** Cancelled sessions are shown where they were cancelled after this. */
  readonly cancelledAfter: Date;
}

/** A feed as its address finds it, with its owner's membership as it is now. */
export interface ReadableFeed {
  readonly id: string;
  readonly teamId: string;
  readonly scope: FeedRow["scope"];
  readonly athleteId: string | null;
  readonly discreet: boolean;
  readonly teamName: string;
  readonly athleteName: string | null;
  readonly role: Role;
  readonly memberAthleteId: string | null;
  /** Camps that are shown, with revision and athlete's name; null where there are none. Changes with whatever is saved. */
  readonly state: string | null;
  /** True where a session may have been cancelled inside the window, so that what is shown changes as the window moves. */
  readonly recent: boolean;
  /** True where the last reading is not noted yet. */
  readonly unnoted: boolean;
}

/**
 * The feed behind a token that is not revoked. Most readings end with this question and nothing else, so it is one
 * statement by the driver itself, which keeps it prepared, as the query builder does not.
 */
export async function findFeedByToken(
  db: Database,
  tokenHash: string,
  { boutsFrom, cancelledAfter }: FeedWindow,
  notedAfter: Date,
): Promise<ReadableFeed | null> {
  const [row] = await db.$client<ReadableFeed[]>`
    select f.id, f.team_id as "teamId", f.scope, f.athlete_id as "athleteId", f.discreet,
      t.name as "teamName", a.name as "athleteName", m.role, m.athlete_id as "memberAthleteId",
      shown.state, coalesce(shown.recent, false) as recent,
      (f.last_read_at is null or f.last_read_at <= ${notedAfter.toISOString()}::timestamptz) as unnoted
    from feeds f
    join teams t on t.id = f.team_id
    join memberships m on m.team_id = f.team_id and m.user_id = f.user_id
    left join athletes a on a.id = f.athlete_id
    cross join lateral (
      select string_agg(c.id || ':' || c.revision || ':' || ca.name, ';' order by c.id) as state,
        bool_or(c.changed_at > ${cancelledAfter.toISOString()}::timestamptz) as recent
      from camps c
      join athletes ca on ca.id = c.athlete_id
      where c.team_id = f.team_id and (f.athlete_id is null or c.athlete_id = f.athlete_id) and c.bout_date >= ${boutsFrom}::date
    ) shown
    where f.token_hash = ${tokenHash} and f.revoked_at is null`;
  return row ?? null;
}

/** What a calendar says of a lift. */
const liftFacts = sql<Pick<
  Lift,
  "sets" | "intensity" | "effort"
> | null>`case when ${sessions.lift} is not null then
  jsonb_build_object('sets', ${sessions.lift}->'sets', 'intensity', ${sessions.lift}->'intensity', 'effort', ${sessions.lift}->'effort') end`;

/** Sessions of the camps that a feed shows (of one athlete, or of the whole team), in order. */
export async function listFeedSessions(
  tx: Tx,
  teamId: string,
  feed: Pick<ReadableFeed, "athleteId">,
  { boutsFrom, cancelledAfter }: FeedWindow,
) {
  return tx
    .select({
      uid: sessions.uid,
      source: sessions.source,
      kind: sessions.kind,
      title: sessions.title,
      place: sessions.place,
      day: sessions.day,
      start: sessions.start,
      startsAt: sessions.startsAt,
      endsAt: sessions.endsAt,
      effort: sessions.effort,
      lift: liftFacts,
      status: sessions.status,
      sequence: sessions.sequence,
      changedAt: sessions.changedAt,
      athleteId: camps.athleteId,
      athleteName: athletes.name,
      boutZone: camps.boutZone,
    })
    .from(camps)
    .innerJoin(athletes, eq(athletes.id, camps.athleteId))
    .innerJoin(sessions, and(eq(sessions.teamId, camps.teamId), eq(sessions.campId, camps.id)))
    .where(
      and(
        eq(camps.teamId, teamId),
        feed.athleteId === null ? undefined : eq(camps.athleteId, feed.athleteId),
        gte(camps.boutDate, boutsFrom),
        or(eq(sessions.status, "confirmed"), gt(sessions.changedAt, cancelledAfter)),
      ),
    )
    .orderBy(asc(sessions.startsAt), asc(sessions.uid));
}

/** Notes a reading. */
export async function markFeedRead(tx: Tx, teamId: string, feedId: string, now: Date): Promise<void> {
  await tx
    .update(feeds)
    .set({ lastReadAt: now })
    .where(and(eq(feeds.teamId, teamId), eq(feeds.id, feedId)));
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
