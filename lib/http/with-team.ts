import type { ZodType } from "zod";
import { database } from "@/db/pool";
import { activeMember } from "@/lib/auth/current-member";
import { now } from "@/lib/clock";
import { AppError, notFound } from "@/lib/errors";
import { can, type Action } from "@/lib/policy";
import type { TeamContext } from "@/lib/services/context";
import { readBody } from "./body";
import { problemResponse } from "./problem";

type Params = Record<string, string>;
type RouteContext = { params: Promise<Params> };

export interface ServiceInput<B> {
  readonly body: B;
  readonly params: Params;
  readonly search: URLSearchParams;
  /** Aborted when the caller leaves. */
  readonly signal: AbortSignal;
}

interface Declaration<B> {
  /** Refused to roles without it. Left out where it depends on the subject: the service then asks the table itself. */
  readonly may?: Action;
  readonly body?: ZodType<B>;
  /** Of a success; 200 unless told otherwise. */
  readonly status?: number;
}

type Service<B, R> = (ctx: TeamContext, input: ServiceInput<B>) => Promise<R>;

async function contextOf(request: Request): Promise<TeamContext> {
  const member = await activeMember(request.headers.get("cookie"));
  if (!member) throw new AppError("unauthenticated", "Sign in first.");
  return {
    db: database(),
    teamId: member.teamId,
    userId: member.userId,
    member: { role: member.role, athleteId: member.athleteId },
    now: now(),
  };
}

function mustAllow(ctx: TeamContext, may: Action | undefined): void {
  if (may && !can(ctx.member, may, ctx.member.athleteId ?? undefined)) {
    throw new AppError("forbidden", "Your role may not do this.");
  }
}

/** JSON of what a service returns; nothing returned is 204. */
export function answer(result: unknown, status = 200): Response {
  if (result instanceof Response) return result;
  if (result === undefined) return new Response(null, { status: 204 });
  return Response.json(result, { status, headers: { "cache-control": "no-store" } });
}

/** A route for members of a team: signed in (401), allowed (403), body checked (422), then the service. */
export function withTeam<B, R>(service: Service<B, R>, declaration: Declaration<B>) {
  return async (request: Request, { params }: RouteContext): Promise<Response> => {
    try {
      const ctx = await contextOf(request);
      mustAllow(ctx, declaration.may);
      const body = declaration.body ? await readBody(request, declaration.body) : (undefined as B);
      const { signal } = request;
      const input = { body, params: await params, search: new URL(request.url).searchParams, signal };
      return answer(await service(ctx, input), declaration.status);
    } catch (error) {
      return problemResponse(error);
    }
  };
}

const UUID = /^[0-9a-f]{8}-[0-9a-f]{4}-[0-9a-f]{4}-[0-9a-f]{4}-[0-9a-f]{12}$/i;

/** The same for a camp named by `params.id`: what is no id cannot be a camp, and is as missing as a foreign one. */
export function withCamp<B, R>(service: Service<B, R>, declaration: Declaration<B>) {
  return withTeam<B, R>((ctx, input) => {
    if (!UUID.test(input.params.id ?? "")) throw notFound();
    return service(ctx, input);
  }, declaration);
}
