import { findSession } from "@/db/queries/athlete-day";
import { writeAudit } from "@/db/queries/audit";
import { listMembers } from "@/db/queries/memberships";
import {
  insertRequest,
  listRequestsOfCamps,
  lockRequest,
  updateRequest,
  type RequestRow,
} from "@/db/queries/requests";
import type { Tx } from "@/db/client";
import { rateLimit } from "@/lib/auth/limits";
import { AppError, notFound } from "@/lib/errors";
import { queueMail } from "@/lib/mail/queue";
import { requestAnswerMail, requestMail } from "@/lib/mail/templates/request";
import { can, type Action } from "@/lib/policy";
import type { RequestView } from "@/lib/schemas/today";
import { loadCamp } from "@/lib/services/camps/load";
import type { TeamContext } from "@/lib/services/context";
import { isId } from "@/lib/services/ids";
import { sessionAt, sessionIn, type SessionRow } from "@/lib/services/logs/session-for";
import { requestView } from "@/lib/services/today/day-session";

type ById = { params: Record<string, string> };

async function mailTo(
  tx: Tx,
  ctx: TeamContext,
  request: RequestRow,
  kind: "request" | "request-answer",
  mail: { subject: string; text: string; html: string },
): Promise<void> {
  const members = await listMembers(tx, ctx.teamId);
  const meant = members.filter(({ role, athleteId }) =>
    kind === "request"
      ? can({ role, athleteId }, "requests.answer")
      : role === "athlete" && athleteId === request.athleteId,
  );
  for (const { userId, email } of meant)
    await queueMail(tx, {
      key: `${kind}:${request.id}:${userId}`,
      kind,
      to: email,
      userId,
      teamId: ctx.teamId,
      ...mail,
    });
}

/** Refuses a session that there is nothing to ask about. */
function mustBeAhead(ctx: TeamContext, session: SessionRow): void {
  if (session.status === "cancelled")
    throw new AppError("conflict", "This session was taken out of the plan already.");
  if (session.startsAt <= ctx.now)
    throw new AppError("conflict", "This session has begun. Log it as missed instead.");
  if (session.source === "bout" || session.source === "weigh-in")
    throw new AppError("conflict", "Talk to your head coach about the bout itself.");
}

/**
 * An athlete cannot make a session and asks: head and S&C coaches are mailed at once, nothing is changed. A retry with the same
 * key answers the same request.
 */
export async function askRequest(
  ctx: TeamContext,
  { params, body }: ById & { body: { key: string; reason: string } },
): Promise<RequestView> {
  await rateLimit(ctx.db, "request-ask-account", ctx.userId);
  return ctx.db.transaction(async (tx) => {
    const camp = await loadCamp(tx, ctx, params.id ?? "", { lock: true });
    if (!can(ctx.member, "requests.ask", camp.athlete.id))
      throw new AppError("forbidden", "Only the athlete asks about a session.");
    const session = sessionIn(camp, params.sid);
    const earlier = (await listRequestsOfCamps(tx, ctx.teamId, [camp.row.id])).filter(
      (row) => row.sessionId === session.id,
    );
    const same = earlier.find((row) => row.id === body.key.toLowerCase());
    if (same) return requestView(same);
    mustBeAhead(ctx, session);
    if (earlier.some((row) => row.state === "asked"))
      throw new AppError("conflict", "You asked about this session already. Your coach has yet to answer.");
    const row = await insertRequest(tx, ctx.teamId, {
      // The key of the write is the request's own id: a retry meets the row that it made.
      id: body.key,
      campId: camp.row.id,
      athleteId: camp.athlete.id,
      sessionId: session.id,
      reason: body.reason,
      createdAt: ctx.now,
    });
    if (!row) throw new AppError("conflict", "This key was used for something else. Ask again.");
    await writeAudit(tx, ctx, "request.ask", row.id, { campId: camp.row.id, sessionId: session.id });
    const { name } = camp.athlete;
    await mailTo(
      tx,
      ctx,
      row,
      "request",
      requestMail({ athlete: name, campId: camp.row.id, session: sessionAt(session), reason: body.reason }),
    );
    return requestView(row);
  });
}

/** The request that a path names, locked, for someone who may do `action`. Not for this member's eyes is as missing. */
async function requestFor(
  tx: Tx,
  ctx: TeamContext,
  id: string | undefined,
  action: Action,
): Promise<RequestRow> {
  const row = isId(id) ? await lockRequest(tx, ctx.teamId, id) : null;
  if (!row || !can(ctx.member, "camps.read", row.athleteId)) throw notFound();
  if (!can(ctx.member, action, row.athleteId)) throw new AppError("forbidden", "Your role may not do this.");
  return row;
}

/** Takes a request back that was not answered yet. Doing it again changes nothing. */
export async function withdrawRequest(ctx: TeamContext, { params }: ById): Promise<RequestView> {
  return ctx.db.transaction(async (tx) => {
    const row = await requestFor(tx, ctx, params.id, "requests.ask");
    if (row.state === "withdrawn") return requestView(row);
    if (row.state !== "asked") throw new AppError("conflict", "Your coach has answered this already.");
    await writeAudit(tx, ctx, "request.withdraw", row.id);
    return requestView(await updateRequest(tx, ctx.teamId, row.id, { state: "withdrawn" }));
  });
}

const ALREADY = {
  accepted: "This request was accepted already.",
  declined: "This request was declined already.",
  withdrawn: "The athlete took this request back.",
} as const;

/**
 * Accepts or declines a request and mails the athlete. No plan is changed: the coach moves or drops the session. The same answer
 * again changes nothing.
 */
export async function answerRequest(
  ctx: TeamContext,
  { params, body }: ById & { body: { state: "accepted" | "declined"; answer: string } },
): Promise<RequestView> {
  return ctx.db.transaction(async (tx) => {
    const row = await requestFor(tx, ctx, params.id, "requests.answer");
    if (row.state === body.state && row.answer === body.answer) return requestView(row);
    if (row.state !== "asked") throw new AppError("conflict", ALREADY[row.state]);
    const saved = await updateRequest(tx, ctx.teamId, row.id, {
      ...body,
      answeredBy: ctx.userId,
      answeredAt: ctx.now,
    });
    await writeAudit(tx, ctx, "request.answer", row.id, { state: body.state });
    const session = await findSession(tx, ctx.teamId, row.campId, row.sessionId);
    const by = (await listMembers(tx, ctx.teamId)).find(({ userId }) => userId === ctx.userId)?.name;
    await mailTo(
      tx,
      ctx,
      row,
      "request-answer",
      requestAnswerMail({
        session: session ? sessionAt(session) : "the session",
        accepted: body.state === "accepted",
        answer: body.answer,
        by: by ?? "Your coach",
      }),
    );
    return requestView(saved);
  });
}
