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
