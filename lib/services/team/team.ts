import { writeAudit } from "@/db/queries/audit";
import { findTeam, updateTeam } from "@/db/queries/teams";
import { notFound } from "@/lib/errors";
import type { TeamForm, TeamView } from "@/lib/schemas/account";
import type { TeamContext } from "@/lib/services/context";

export async function readTeam(ctx: TeamContext): Promise<TeamView> {
  const team = await findTeam(ctx.db, ctx.teamId);
  if (!team) throw notFound();
  return { id: team.id, name: team.name, timeZone: team.timeZone };
}

/** Changes the team's name and home zone; running camps keep the zone that they were laid out in. */
export async function renameTeam(ctx: TeamContext, { body }: { body: TeamForm }): Promise<TeamView> {
  await ctx.db.transaction(async (tx) => {
    await updateTeam(tx, ctx.teamId, body);
    await writeAudit(tx, ctx, "team.update", ctx.teamId, { ...body });
  });
  return readTeam(ctx);
}
