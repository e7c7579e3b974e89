import { notFound } from "next/navigation";
import { database } from "@/db/pool";
import { requireMember } from "@/lib/auth/page-member";
import type { ActiveMember } from "@/lib/auth/current-member";
import { now } from "@/lib/clock";
import { AppError } from "@/lib/errors";
import { can, type Action } from "@/lib/policy";
import type { PublicContext, TeamContext } from "@/lib/services/context";

/**
 * What a page of a team works with: the context of services and the person who looks. Leads to the sign-in where nobody
 * is signed in; a page that the role may not see is as missing as one that does not exist.
 */
export async function pageContext(may?: Action): Promise<TeamContext & { readonly person: ActiveMember }> {
  const person = await requireMember();
  const member = { role: person.role, athleteId: person.athleteId };
  if (may && !can(member, may, member.athleteId ?? undefined)) notFound();
  return { db: database(), teamId: person.teamId, userId: person.userId, member, now: now(), person };
}

/** What a service gives, or the page for what is missing. */
export async function orNotFound<T>(work: Promise<T>): Promise<T> {
  try {
    return await work;
  } catch (error) {
    if (error instanceof AppError && (error.code === "not-found" || error.code === "forbidden")) notFound();
    throw error;
  }
}

/** What a page for anyone works with. */
export const publicContext = (): Pick<PublicContext, "db" | "now"> => ({ db: database(), now: now() });
