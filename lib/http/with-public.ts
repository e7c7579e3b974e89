import type { ZodType } from "zod";
import { RateLimiterMemory, RateLimiterRes } from "rate-limiter-flexible";
import { database } from "@/db/pool";
import { addressIn } from "@/lib/auth/address";
import { activeMember } from "@/lib/auth/current-member";
import { now } from "@/lib/clock";
import { AppError } from "@/lib/errors";
import type { PublicContext } from "@/lib/services/context";
import { readBody } from "./body";
import { problemResponse } from "./problem";
import { answer } from "./with-team";

interface Limit {
  readonly name: string;
  readonly calls: () => number;
  readonly seconds: number;
}

interface Declaration<B> {
  readonly body: ZodType<B>;
  /** Of a success; 200 unless told otherwise. */
  readonly status?: number;
}

const addressOf = (request: Request): string => addressIn(request.headers.get("x-forwarded-for"));

function limiterOf({ name, calls, seconds }: Limit): (request: Request) => Promise<void> {
  let limiter: RateLimiterMemory | undefined;
  return async (request) => {
    limiter ??= new RateLimiterMemory({ keyPrefix: name, points: calls(), duration: seconds });
    try {
      await limiter.consume(addressOf(request));
    } catch (refused) {
      if (!(refused instanceof RateLimiterRes)) throw refused;
      throw new AppError("too-many", "Too many requests from this address. Wait a moment.", {
        retryAfter: refused.msBeforeNext / 1000,
      });
    }
  };
}

/** A route for anyone that keeps nothing: limited per address and process (429), body checked (422), then the service. */
export function withPublic<B, R>(
  service: (input: { body: B; now: Date }) => Promise<R>,
  declaration: Declaration<B> & { readonly limit: Limit },
) {
  const limit = limiterOf(declaration.limit);
  return async (request: Request): Promise<Response> => {
    try {
      await limit(request);
      const body = await readBody(request, declaration.body);
      return answer(await service({ body, now: now() }), declaration.status);
    } catch (error) {
      return problemResponse(error);
    }
  };
}

const contextOf = (request: Request): PublicContext => ({
  db: database(),
  now: now(),
  address: addressOf(request),
  signedIn: async () => (await activeMember(request.headers.get("cookie")))?.userId ?? null,
});

/** A route for people without an account or a session; the service limits itself by what it is asked. */
export function withAnyone<B, R>(
  service: (ctx: PublicContext, input: { body: B }) => Promise<R>,
  declaration: Declaration<B>,
) {
  return async (request: Request): Promise<Response> => {
    try {
      const body = await readBody(request, declaration.body);
      return answer(await service(contextOf(request), { body }), declaration.status);
    } catch (error) {
      return problemResponse(error);
    }
  };
}
