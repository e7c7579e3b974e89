import type { Database } from "@/db/client";
import type { Member } from "@/lib/policy";

/** Who acts, in which team, and when: the first argument of every service. */
export interface TeamContext {
  readonly db: Database;
  readonly teamId: string;
  readonly userId: string;
  readonly member: Member;
  readonly now: Date;
}

/** Someone who need not be signed in: what services for anyone take first. */
export interface PublicContext {
  readonly db: Database;
  readonly now: Date;
  /** Where the request came from, for limits. */
  readonly address: string;
  /** Id of the person whose session the request carries. */
  readonly signedIn: () => Promise<string | null>;
}
