import { listAthletes } from "@/db/queries/athletes";
import { can } from "@/lib/policy";
import type { TeamContext } from "@/lib/services/context";

/** Athletes whose camp this member may see, by name: the team's for staff, one for an athlete or a guest. */
export async function listFollowable(ctx: TeamContext): Promise<{ id: string; name: string }[]> {
  const rows = await listAthletes(ctx.db, ctx.teamId);
  return rows.filter((row) => can(ctx.member, "camps.read", row.id)).map(({ id, name }) => ({ id, name }));
}
