import { findActiveMember } from "@/db/queries/memberships";
import { database } from "@/db/pool";
import { sessionClaims } from "./session-token";

export type ActiveMember = NonNullable<Awaited<ReturnType<typeof findActiveMember>>>;

/**
 * Who a request comes from, asked of the database every time: a session ends at once when the person is removed or the
 * password changes. Null where nobody is signed in.
 */
export async function activeMember(cookieHeader: string | null): Promise<ActiveMember | null> {
  const claims = await sessionClaims(cookieHeader);
  return claims && findActiveMember(database(), claims.userId, claims.version);
}
