import { z } from "zod";
import { findAthlete } from "@/db/queries/athletes";
import { writeAudit } from "@/db/queries/audit";
import {
  countFeedsOf,
  insertFeed,
  listFeedsOf,
  lockFeedOf,
  replaceFeedToken,
  revokeFeedRow,
  type FeedRow,
} from "@/db/queries/feeds";
import type { Tx } from "@/db/client";
import { AppError, notFound } from "@/lib/errors";
import type { FeedForm, FeedView, NewFeed } from "@/lib/schemas/feed";
import type { TeamContext } from "@/lib/services/context";
import { mayFollow } from "./allowed";
import { addressOf, hashOf, newToken } from "./token";

type Named = { readonly id: string; readonly name: string };

/** Subscriptions that one person may have in a team: one a device and athlete is plenty. */
const MOST_FEEDS = 50;

const viewOf = (ctx: TeamContext, feed: FeedRow, athlete: Named | null): FeedView => ({
  id: feed.id,
  athlete,
  discreet: feed.discreet,
  createdAt: feed.createdAt.toISOString(),
  lastReadAt: feed.lastReadAt?.toISOString() ?? null,
  allowed: mayFollow(ctx.member, feed.athleteId),
});

/** One's own subscriptions in this team. */
export async function listFeeds(ctx: TeamContext): Promise<{ feeds: FeedView[] }> {
  const rows = await listFeedsOf(ctx.db, ctx.teamId, ctx.userId);
  return { feeds: rows.map(({ feed, athlete }) => viewOf(ctx, feed, athlete)) };
}

async function athleteOf(tx: Tx, ctx: TeamContext, form: FeedForm): Promise<Named | null> {
  if (form.scope === "team") {
    if (!mayFollow(ctx.member, null))
      throw new AppError("forbidden", "Your role may not follow the whole team.");
    return null;
  }
  const athlete = await findAthlete(tx, ctx.teamId, form.athleteId);
  if (!athlete || !mayFollow(ctx.member, athlete.id)) throw notFound();
  return { id: athlete.id, name: athlete.name };
}

/** Makes a subscription. Its address is in the answer and nowhere else. */
export async function createFeed(ctx: TeamContext, { body }: { body: FeedForm }): Promise<NewFeed> {
  return ctx.db.transaction(async (tx) => {
    const athlete = await athleteOf(tx, ctx, body);
    if ((await countFeedsOf(tx, ctx.teamId, ctx.userId)) >= MOST_FEEDS) {
      throw new AppError("conflict", `You have ${MOST_FEEDS} subscriptions. End one that you no longer use.`);
    }
    const token = newToken();
    const feed = await insertFeed(tx, ctx.teamId, {
      userId: ctx.userId,
      scope: body.scope,
      athleteId: athlete?.id ?? null,
      discreet: body.discreet,
      tokenHash: hashOf(token),
      createdAt: ctx.now,
    });
    await writeAudit(tx, ctx, "feed.create", feed.id, { scope: body.scope, athleteId: athlete?.id ?? null });
    return { feed: viewOf(ctx, feed, athlete), address: addressOf(token) };
  });
}

type ById = { params: Record<string, string> };

async function ownFeed(tx: Tx, ctx: TeamContext, { params }: ById) {
  const id = z.guid().safeParse(params.id);
  const row = id.success ? await lockFeedOf(tx, ctx.teamId, ctx.userId, id.data) : null;
  if (!row) throw notFound();
  return row;
}

/** Gives a subscription a new address; the old one answers 404 from now on. */
export async function renewFeed(ctx: TeamContext, input: ById): Promise<NewFeed> {
  return ctx.db.transaction(async (tx) => {
    const { feed, athlete } = await ownFeed(tx, ctx, input);
    if (!mayFollow(ctx.member, feed.athleteId))
      throw new AppError("forbidden", "Your role may no longer follow this calendar.");
    const token = newToken();
    await replaceFeedToken(tx, ctx.teamId, feed.id, hashOf(token));
    await writeAudit(tx, ctx, "feed.renew", feed.id, {});
    return { feed: viewOf(ctx, { ...feed, lastReadAt: null }, athlete), address: addressOf(token) };
  });
}

/** Ends a subscription: its address answers 404 from now on. */
export async function revokeFeed(ctx: TeamContext, input: ById): Promise<void> {
  await ctx.db.transaction(async (tx) => {
    const { feed } = await ownFeed(tx, ctx, input);
    await revokeFeedRow(tx, ctx.teamId, feed.id, ctx.now);
    await writeAudit(tx, ctx, "feed.revoke", feed.id, {});
  });
}
