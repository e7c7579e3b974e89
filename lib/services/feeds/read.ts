import { createHash } from "node:crypto";
import {
  findFeedByToken,
  listFeedSessions,
  markFeedRead,
  type FeedWindow,
  type ReadableFeed,
} from "@/db/queries/feeds";
import type { Database, Tx } from "@/db/client";
import { buildFeed } from "@/lib/calendar/feed";
import { notFound } from "@/lib/errors";
import type { Member } from "@/lib/policy";
import { mayFollow } from "./allowed";
import { eventsOf } from "./events";
import { hashOf, isToken } from "./token";

const DAY_MS = 86_400_000;
/** A dropped session stays as cancelled for so long, so that calendars that look seldom see it go. */
const CANCELLED_DAYS = 30;
/** Camps whose bout is longer ago are left out. */
const PAST_DAYS = 366;
/** A reading is written down at most this often. */
const NOTE_EVERY_MS = 3_600_000;

/** Raise it when the same sessions are written another way: calendars then fetch them again. */
const FORMAT = 1;

const windowAt = (now: Date): FeedWindow => ({
  boutsFrom: new Date(now.getTime() - PAST_DAYS * DAY_MS).toISOString().slice(0, 10),
  cancelledAfter: new Date(now.getTime() - CANCELLED_DAYS * DAY_MS),
});

const memberOf = ({ role, memberAthleteId }: ReadableFeed): Member => ({ role, athleteId: memberAthleteId });

/** Strong: the same tag is the same bytes (RFC 9110 8.8.3). What is in it decides all that `build` writes. */
function tagOf(feed: ReadableFeed): string {
  const { id, scope, discreet, teamName, role, memberAthleteId, state, cancelled } = feed;
  const all = JSON.stringify([
    FORMAT,
    id,
    scope,
    discreet,
    teamName,
    role,
    memberAthleteId,
    state,
    cancelled,
  ]);
  return `"${createHash("sha256").update(all).digest("base64url").slice(0, 32)}"`;
}

async function openFeed(tx: Tx, token: string, window: FeedWindow): Promise<ReadableFeed> {
  const feed = isToken(token) ? await findFeedByToken(tx, hashOf(token), window) : null;
  if (!feed || !mayFollow(memberOf(feed), feed.athleteId)) throw notFound();
  return feed;
}

/** A calendar behind a secret address. */
export interface FeedReading {
  readonly etag: string;
  /** Writes the calendar; `etag` is that of what it wrote. */
  readonly build: () => Promise<{ readonly etag: string; readonly body: string }>;
}

/**
 * Looks up the calendar of a token: one cheap question, so that an unchanged one costs no building. Missing, revoked,
 * left the team and no longer allowed all throw the same `not-found`.
 */
export async function readFeed(db: Database, token: string, now: Date): Promise<FeedReading> {
  const window = windowAt(now);
  const feed = await openFeed(db, token, window);
  const noteAfter = new Date(now.getTime() - NOTE_EVERY_MS);
  if (feed.lastReadAt === null || feed.lastReadAt < noteAfter)
    await markFeedRead(db, feed.teamId, feed.id, now, noteAfter);
  return { etag: tagOf(feed), build: () => build(db, token, window) };
}

/** Tag and body from one snapshot, whatever is saved meanwhile. */
async function build(
  db: Database,
  token: string,
  window: FeedWindow,
): Promise<{ etag: string; body: string }> {
  return db.transaction(
    async (tx) => {
      const feed = await openFeed(tx, token, window);
      const rows = await listFeedSessions(tx, feed.teamId, feed.id, window);
      const events = eventsOf(rows, memberOf(feed), feed.scope);
      const newest = Math.max(...events.map((event) => event.changedAt.getTime()));
      const body = buildFeed({
        name: nameOf(feed),
        discreet: feed.discreet,
        events,
        refreshedAt: events.length > 0 ? new Date(newest) : null,
      });
      return { etag: tagOf(feed), body };
    },
    { isolationLevel: "repeatable read", accessMode: "read only" },
  );
}

function nameOf({ discreet, teamName, athleteName }: ReadableFeed): string {
  if (discreet) return "Calendar";
  return athleteName === null ? teamName : `${athleteName}, ${teamName}`;
}
