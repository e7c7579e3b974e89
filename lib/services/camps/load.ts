import type { CampRow } from "@/db/queries/camps";
import { findCamp, loadCampParts, lockCamp } from "@/db/queries/camps";
import { bookOf } from "@/db/mappers/camp-book";
import { liftsOf } from "@/db/mappers/sessions";
import type { Tx } from "@/db/client";
import type { StandingCamp } from "@/lib/book";
import { notFound } from "@/lib/errors";
import { can } from "@/lib/policy";
import type { TeamContext } from "@/lib/services/context";
import { isId } from "@/lib/services/ids";

export interface LoadedCamp extends StandingCamp {
  readonly row: CampRow;
  readonly athlete: { readonly id: string; readonly name: string };
  readonly sessions: Awaited<ReturnType<typeof loadCampParts>>["sessions"];
}

/** A camp with its standing plan. Missing, foreign and not for this member's eyes give the same 404. */
export async function loadCamp(
  tx: Tx,
  ctx: TeamContext,
  campId: string,
  options: { lock?: boolean } = {},
): Promise<LoadedCamp> {
  const row = isId(campId) ? await (options.lock ? lockCamp : findCamp)(tx, ctx.teamId, campId) : null;
  if (!row || !can(ctx.member, "camps.read", row.athleteId)) throw notFound();
  const parts = await loadCampParts(tx, row);
  return {
    row,
    athlete: parts.athlete,
    sessions: parts.sessions,
    book: bookOf({ camp: row, ...parts }),
    plan: { ...row.summary, lifts: liftsOf(parts.sessions, ctx.now) },
  };
}
