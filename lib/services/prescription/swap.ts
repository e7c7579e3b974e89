import { findAthlete } from "@/db/queries/athletes";
import { writeAudit } from "@/db/queries/audit";
import { listSwaps, putSwap, removeSwap } from "@/db/queries/overrides";
import type { Tx } from "@/db/client";
import type { Swap } from "@/lib/engine";
import { whyNot } from "@/lib/engine/prescription/empty";
import { AppError, notFound } from "@/lib/errors";
import { can } from "@/lib/policy";
import type { DropSwap, SwapForm } from "@/lib/schemas/prescription";
import { loadCamp, type LoadedCamp } from "@/lib/services/camps/load";
import type { TeamContext } from "@/lib/services/context";
import { usedExercises } from "./used-exercises";

interface SwapsView {
  readonly swaps: readonly Swap[];
}

async function campFor(tx: Tx, ctx: TeamContext, campId: string | undefined): Promise<LoadedCamp> {
  const camp = await loadCamp(tx, ctx, campId ?? "", { lock: true });
  if (!can(ctx.member, "prescription.swap", camp.athlete.id))
    throw new AppError("forbidden", "Your role may not do this.");
  if (camp.row.status === "off") throw new AppError("conflict", "The bout is off.");
  return camp;
}

const refused = (field: "from" | "to", message: string): AppError =>
  new AppError("invalid", message, { errors: [{ pointer: `/${field}`, message }] });

/** Refuses what would not be the same work, or what this athlete may not do. */
async function mustFit(tx: Tx, ctx: TeamContext, camp: LoadedCamp, { from, to }: SwapForm): Promise<void> {
  const [athlete, exercises] = await Promise.all([
    findAthlete(tx, ctx.teamId, camp.athlete.id),
    usedExercises(tx, ctx.teamId),
  ]);
  const [was, wanted] = [from, to].map((id) => exercises.find((exercise) => exercise.id === id));
  if (!was) throw refused("from", "The team has no such exercise.");
  if (!wanted) throw refused("to", "The team has no such exercise.");
  if (from === to) throw refused("to", "That is the same exercise.");
  if (was.qualities[0] === "mobility") throw refused("from", "Warm-ups are not swapped.");
  if (!wanted.qualities.some((quality) => was.qualities.includes(quality)))
    throw refused("to", `${wanted.name} trains nothing that ${was.name} does.`);
  const why = whyNot(wanted, {
    equipment: new Set(athlete?.equipment ?? []),
    limitations: new Set(athlete?.limitationCodes ?? []),
  });
  if (why !== "") throw refused("to", `${wanted.name}: ${why}.`);
}

/**
 * One exercise instead of another in all sessions of an item in this camp, past ones that were logged left as they were. A second
 * swap of the same exercise takes the place of the first.
 */
export async function saveSwap(
  ctx: TeamContext,
  { params, body }: { params: Record<string, string>; body: SwapForm },
): Promise<SwapsView> {
  return ctx.db.transaction(async (tx) => {
    const camp = await campFor(tx, ctx, params.id);
    await mustFit(tx, ctx, camp, body);
    const name = { teamId: ctx.teamId, campId: camp.row.id };
    await putSwap(tx, name, body, { userId: ctx.userId, at: ctx.now });
    await writeAudit(tx, ctx, "prescription.swap", camp.row.id, { ...body });
    return { swaps: await listSwaps(tx, name) };
  });
}

/** Puts a swap back: the exercise takes its turns again. */
export async function dropSwap(
  ctx: TeamContext,
  { params, body }: { params: Record<string, string>; body: DropSwap },
): Promise<SwapsView> {
  return ctx.db.transaction(async (tx) => {
    const camp = await campFor(tx, ctx, params.id);
    const name = { teamId: ctx.teamId, campId: camp.row.id };
    if (!(await removeSwap(tx, name, body))) throw notFound();
    await writeAudit(tx, ctx, "prescription.swap-back", camp.row.id, { ...body });
    return { swaps: await listSwaps(tx, name) };
  });
}
