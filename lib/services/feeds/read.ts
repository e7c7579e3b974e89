import { createHash } from "node:crypto";
import {
  findFeedByToken,
  listFeedSessions,
  markFeedRead,
  type FeedWindow,
  type ReadableFeed,
} from "@/db/queries/feeds";
import type { Database } from "@/db/client";
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

/** What is shown moves with the day (UTC), not with the minute: a tag then holds for a day at least. */
function windowAt(now: Date): FeedWindow & { readonly day: string } {
  const day = now.toISOString().slice(0, 10);
  const midnight = Date.parse(day);
  return {
    day,
    boutsFrom: new Date(midnight - PAST_DAYS * DAY_MS).toISOString().slice(0, 10),
    cancelledAfter: new Date(midnight - CANCELLED_DAYS * DAY_MS),
  };
}

const memberOf = ({ role, memberAthleteId }: ReadableFeed): Member => ({ role, athleteId: memberAthleteId });

/**
 * Strong: the same tag is the same bytes (RFC 9110 8.8.3). What is in it decides all that is written: the sessions follow
 * from the camps' revisions, and from the day as long as one of them may still show a cancelled session.
 */
function tagOf({ unnoted: _, recent, ...feed }: ReadableFeed, day: string): string {
  const all = JSON.stringify([FORMAT, Object.entries(feed).sort(), recent ? day : null]);
  return `"${createHash("sha256").update(all).digest("base64url").slice(0, 32)}"`;
}

async function openFeed(db: Database, token: string, now: Date): Promise<ReadableFeed> {
  const notedAfter = new Date(now.getTime() - NOTE_EVERY_MS);
  const feed = isToken(token) ? await findFeedByToken(db, hashOf(token), windowAt(now), notedAfter) : null;
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
  const feed = await openFeed(db, token, now);
  if (feed.unnoted) await markFeedRead(db, feed.teamId, feed.id, now);
  const etag = tagOf(feed, windowAt(now).day);
  const body = bodies.get(etag);
  return { etag, build: async () => (body === undefined ? build(db, token, now) : { etag, body }) };
}

/** Bodies by their tag: the same tag is the same bytes, and one phone asks for what another of the team has just got. */
const bodies = new Map<string, string>();
/** A body is some tens of kB. */
const MOST_BODIES = 200;

function kept(etag: string, body: string): string {
  const oldest = bodies.keys().next();
  if (bodies.size >= MOST_BODIES && !oldest.done) bodies.delete(oldest.value);
  bodies.set(etag, body);
  return body;
}

/** How often a calendar is written anew because something was saved meanwhile. */
const TRIES = 3;

/**
 * Tag and body of one state: nothing was saved between reading the tag and the sessions if the tag is still the same after.
 * Where saving does not stop, the older tag is given: the next question then gets the newer state.
 */
async function build(db: Database, token: string, now: Date): Promise<{ etag: string; body: string }> {
  const window = windowAt(now);
  let feed = await openFeed(db, token, now);
  for (let tried = 1; ; tried++) {
    const rows = await listFeedSessions(db, feed.teamId, feed, window);
    const etag = tagOf(feed, window.day);
    const after = await openFeed(db, token, now);
    if (tagOf(after, window.day) === etag) return { etag, body: kept(etag, bodyOf(feed, rows)) };
    if (tried === TRIES) return { etag, body: bodyOf(feed, rows) };
    feed = after;
  }
}

function bodyOf(feed: ReadableFeed, rows: Awaited<ReturnType<typeof listFeedSessions>>): string {
  const events = eventsOf(rows, memberOf(feed), feed.scope);
  const newest = Math.max(...events.map((event) => event.changedAt.getTime()));
  return buildFeed({
    name: nameOf(feed),
    discreet: feed.discreet,
    events,
    refreshedAt: events.length > 0 ? new Date(newest) : null,
  });
}

function nameOf({ discreet, teamName, athleteName }: ReadableFeed): string {
  if (discreet) return "Calendar";
  return athleteName === null ? teamName : `${athleteName}, ${teamName}`;
}
