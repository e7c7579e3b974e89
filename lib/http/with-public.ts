import type { ZodType } from "zod";
import { RateLimiterMemory, RateLimiterRes } from "rate-limiter-flexible";
import { now } from "@/lib/clock";
import { AppError } from "@/lib/errors";
import { readBody } from "./body";
import { problemResponse } from "./problem";
import { answer } from "./with-team";

interface Limit {
  readonly name: string;
  readonly calls: () => number;
  readonly seconds: number;
}

/**
 * Address that a request comes from. A proxy in front must set `x-forwarded-for`; Next does so for direct connections.
 */
export const addressOf = (request: Request): string =>
  request.headers.get("x-forwarded-for")?.split(",").at(-1)?.trim() || "direct";

/** A route for anyone: limited per address and process (429), body checked (422), then the service. */
export function withPublic<B, R>(
  service: (input: { body: B; now: Date }) => Promise<R>,
  declaration: { readonly body: ZodType<B>; readonly limit: Limit },
) {
  const { name, calls, seconds } = declaration.limit;
  let limiter: RateLimiterMemory | undefined;
  const limit = async (request: Request): Promise<void> => {
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
  return async (request: Request): Promise<Response> => {
    try {
      await limit(request);
      return answer(await service({ body: await readBody(request, declaration.body), now: now() }));
    } catch (error) {
      return problemResponse(error);
    }
  };
}
