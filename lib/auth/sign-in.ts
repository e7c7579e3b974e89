import { findUserByEmail } from "@/db/queries/users";
import type { Database } from "@/db/client";
import { forgetTries, rateLimit, uncount } from "./limits";
import { verifyPassword } from "./password";

/** What a session cookie is made of. */
export interface SignedIn {
  readonly id: string;
  readonly version: number;
}

/**
 * Checks e-mail and password. Null for a wrong password and for an unknown e-mail alike, after the same work.
 * Throws `too-many` beyond the limits per account and address; tries are counted before the work, so that many at once
 * do not slip through, and given back where the password was right.
 */
export async function checkSignIn(
  db: Database,
  given: { readonly email: string; readonly password: string; readonly address: string },
): Promise<SignedIn | null> {
  const { email, password, address } = given;
  await rateLimit(db, "sign-in-address", address);
  await rateLimit(db, "sign-in-account", email);
  const user = await findUserByEmail(db, email);
  if (!(await verifyPassword(user?.passwordHash ?? null, password)) || !user) return null;
  await Promise.all([uncount(db, "sign-in-address", address), forgetTries(db, "sign-in-account", email)]);
  return { id: user.id, version: user.sessionVersion };
}
