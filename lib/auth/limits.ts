import { createHash } from "node:crypto";
import { RateLimiterRes } from "rate-limiter-flexible";
import { rateLimiter } from "@/db/queries/rate-limits";
import type { Database } from "@/db/client";
import { AppError } from "@/lib/errors";

const MINUTES = 60;

/**
 * Tries per person or address. An account's limit stops guessing from many addresses, an address's limit stops guessing
 * at many accounts; a gym shares one address, hence its larger number. Sign-in counts failures only.
 */
export const LIMITS = {
  "sign-in-account": { points: 10, seconds: 15 * MINUTES },
  "sign-in-address": { points: 50, seconds: 15 * MINUTES },
  "sign-up-account": { points: 5, seconds: 60 * MINUTES },
  "sign-up-address": { points: 30, seconds: 60 * MINUTES },
  "reset-account": { points: 5, seconds: 60 * MINUTES },
  "reset-address": { points: 30, seconds: 60 * MINUTES },
  "reset-confirm-address": { points: 30, seconds: 15 * MINUTES },
  "invite-accept-address": { points: 30, seconds: 15 * MINUTES },
  "invite-send-team": { points: 50, seconds: 24 * 60 * MINUTES },
  // Each question mails the coaches: enough for a phone that tries again, too little to flood a mailbox.
  "request-ask-account": { points: 40, seconds: 24 * 60 * MINUTES },
  "password-account": { points: 10, seconds: 15 * MINUTES },
} as const;
export type LimitName = keyof typeof LIMITS;

const limiterOf = (db: Database, name: LimitName) => rateLimiter(db, { name, ...LIMITS[name] });

const hidden = (key: string): string => createHash("sha256").update(key.toLowerCase()).digest("base64url");

/** Counts one try of `key` (an e-mail, an id or an address); throws `too-many` with the seconds to wait. */
export async function rateLimit(db: Database, name: LimitName, key: string): Promise<void> {
  try {
    await limiterOf(db, name).consume(hidden(key));
  } catch (refused) {
    if (!(refused instanceof RateLimiterRes)) throw refused;
    throw new AppError("too-many", "Too many tries. Wait a few minutes and try again.", {
      retryAfter: refused.msBeforeNext / 1000,
    });
  }
}

/** Takes back one counted try: it turned out to be right. */
export async function uncount(db: Database, name: LimitName, key: string): Promise<void> {
  await limiterOf(db, name).reward(hidden(key), 1);
}

/** Forgets all tries of `key`. */
export async function forgetTries(db: Database, name: LimitName, key: string): Promise<void> {
  await limiterOf(db, name).delete(hidden(key));
}
