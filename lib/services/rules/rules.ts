import { writeAudit } from "@/db/queries/audit";
import { findTeam, updateTeam } from "@/db/queries/teams";
import { DEFAULT_RULES, RULE_KEYS } from "@/lib/engine/rules/house-rules";
import { notFound } from "@/lib/errors";
import type { HouseRulesForm, HouseRulesSaved, HouseRulesView } from "@/lib/schemas/house-rules";
import { replan } from "@/lib/services/camps/replan";
import type { TeamContext } from "@/lib/services/context";

/** The team's own values; every rule without one has its default. */
export async function readRules(ctx: TeamContext): Promise<HouseRulesView> {
  const team = await findTeam(ctx.db, ctx.teamId);
  if (!team) throw notFound();
  return { overrides: team.ruleOverrides };
}

/** What differs from the default is kept; a value put back to the default follows it again. */
const ownValues = (given: Readonly<Record<string, number>>): Record<string, number> =>
  Object.fromEntries(
    RULE_KEYS.flatMap((key) => {
      const value = given[key];
      return value === undefined || value === DEFAULT_RULES[key] ? [] : [[key, value]];
    }),
  );

/** Replaces the team's own values; open camps are planned again in the same transaction. */
export async function saveRules(
  ctx: TeamContext,
  { body }: { body: HouseRulesForm },
): Promise<HouseRulesSaved> {
  const overrides = ownValues(body.overrides);
  return ctx.db.transaction(async (tx) => {
    const team = await findTeam(tx, ctx.teamId);
    if (!team) throw notFound();
    await updateTeam(tx, ctx.teamId, { ruleOverrides: overrides });
    await writeAudit(tx, ctx, "rules.update", ctx.teamId, { from: team.ruleOverrides, to: overrides });
    return { overrides, replanned: await replan(tx, ctx, "House rules were changed") };
  });
}
