import { isDeepStrictEqual } from "node:util";
import type { Tx } from "@/db/client";
import type { AthleteRow } from "@/db/queries/athletes";
import { insertLimitations, listLimitationHistory } from "@/db/queries/limitations";
import type { Limitation } from "@/lib/engine/prescription/exercise";
import type { TeamContext } from "@/lib/services/context";

interface Limitations {
  readonly id: string;
  readonly limitations: string;
  readonly limitationCodes: Limitation[];
}

const partOf = ({ limitations, limitationCodes }: Limitations) => ({
  limitations,
  limitationCodes: [...limitationCodes].sort(),
});

/** When the athlete was added; before `now` also where the database's clock is ahead of the server's. */
const earlier = ({ createdAt }: AthleteRow, now: Date): Date =>
  createdAt < now ? createdAt : new Date(now.getTime() - 1);

/** Writes what an athlete's limitations are from now on, where they changed; `before` is null for a new athlete. */
export async function noteLimitations(
  tx: Tx,
  ctx: TeamContext,
  before: AthleteRow | null,
  after: Limitations,
): Promise<void> {
  const { teamId, userId } = ctx;
  const was = before ? partOf(before) : { limitations: "", limitationCodes: [] };
  if (isDeepStrictEqual(was, partOf(after))) return;
  const of = { teamId, athleteId: after.id };
  // Athletes who came with a camp have no line yet: what stood until now must not be lost.
  const first = before !== null && (await listLimitationHistory(tx, teamId, after.id)).length === 0;
  if (first)
    await insertLimitations(tx, { ...of, ...was, userId: null, createdAt: earlier(before, ctx.now) });
  await insertLimitations(tx, { ...of, ...partOf(after), userId, createdAt: ctx.now });
}
