import { writeAudit } from "@/db/queries/audit";
import { findDecision, insertDecision, listDecisions } from "@/db/queries/suggestions";
import type { Tx } from "@/db/client";
import { changeOfSuggestion } from "@/lib/book";
import { AppError, notFound } from "@/lib/errors";
import { can } from "@/lib/policy";
import type {
  AcceptAnswer,
  AcceptSuggestion,
  DecisionView,
  DismissSuggestion,
} from "@/lib/schemas/suggestion";
import { loadCamp, type LoadedCamp } from "@/lib/services/camps/load";
import { saveChangeIn } from "@/lib/services/camps/save-change";
import type { TeamContext } from "@/lib/services/context";
import { decoded } from "@/lib/services/logs/session-for";
import { decisionView, suggestionsFor } from "./waiting";

type Named = { params: Record<string, string> };
type Decision = "accepted" | "dismissed";

const ALREADY: Readonly<Record<Decision, string>> = {
  accepted: "This suggestion was accepted already.",
  dismissed: "This suggestion was dismissed already.",
};

/** The camp that a path names, locked, for someone who decides on its suggestions. */
async function campFor(tx: Tx, ctx: TeamContext, { params }: Named): Promise<LoadedCamp> {
  const camp = await loadCamp(tx, ctx, params.id ?? "", { lock: true });
  if (!can(ctx.member, "suggestions.decide", camp.athlete.id))
    throw new AppError("forbidden", "Your role may not do this.");
  return camp;
}

async function decisionOn(tx: Tx, ctx: TeamContext, campId: string, key: string): Promise<DecisionView> {
  const row = (await listDecisions(tx, ctx.teamId, campId)).find((decision) => decision.key === key);
  if (!row) throw new Error("A decision that was just written is gone.");
  return decisionView(row);
}

/** True where the same was decided before: a retry then answers the same. The other decision is a conflict. */
async function decidedBefore(
  tx: Tx,
  ctx: TeamContext,
  campId: string,
  key: string,
  decision: Decision,
): Promise<boolean> {
  const known = await findDecision(tx, ctx.teamId, campId, key);
  if (known && known.decision !== decision) throw new AppError("conflict", ALREADY[known.decision]);
  return known !== null;
}

/** The suggestion that a path names, as it stands now: what was logged since may have taken it away. */
async function suggestionFor(tx: Tx, ctx: TeamContext, campId: string, key: string) {
  const { open } = await suggestionsFor(tx, ctx, campId);
  const found = open.find((suggestion) => suggestion.key === key);
  if (!found) throw notFound();
  return found;
}

async function record(
  tx: Tx,
  ctx: TeamContext,
  campId: string,
  given: { key: string; title: string; decision: Decision; reason: string; revision: number | null },
): Promise<DecisionView> {
  await insertDecision(tx, { teamId: ctx.teamId, campId, ...given, userId: ctx.userId, createdAt: ctx.now });
  const { key, decision, revision } = given;
  await writeAudit(tx, ctx, "suggestion.decide", campId, { key, decision, revision });
  return decisionOn(tx, ctx, campId, key);
}

/**
 * Accepts a suggestion: saves its change at the revision that its effect was shown against and records the decision, together or
 * not at all. One without a change is recorded as seen. A retry changes nothing. Throws `stale` with what others changed,
 * `conflict` where it was dismissed, `not-found` where it does not stand any more.
 */
export async function acceptSuggestion(
  ctx: TeamContext,
  { params, body }: Named & { body: AcceptSuggestion },
): Promise<AcceptAnswer> {
  return ctx.db.transaction(async (tx) => {
    const camp = await campFor(tx, ctx, { params });
    const campId = camp.row.id;
    const key = decoded(params.key ?? "");
    if (await decidedBefore(tx, ctx, campId, key, "accepted")) {
      const decision = await decisionOn(tx, ctx, campId, key);
      const { revision } = decision;
      return { decision, saved: revision === null ? null : { revision, told: 0 } };
    }
    const suggestion = await suggestionFor(tx, ctx, campId, key);
    const change = changeOfSuggestion(suggestion);
    const { baseRevision, idempotencyKey, note } = body;
    const answer = change && (await saveChangeIn(tx, ctx, camp, { change, baseRevision, idempotencyKey }));
    // A change that the book held already makes no revision, and there is none to put back.
    const saved =
      answer && answer.revision > camp.row.revision ? { revision: answer.revision, told: answer.told } : null;
    const decision = await record(tx, ctx, campId, {
      key,
      title: suggestion.title,
      decision: "accepted",
      reason: note,
      revision: saved?.revision ?? null,
    });
    return { decision, saved };
  });
}

/** Dismisses a suggestion with a reason; the plan stays as it is. A retry changes nothing. Throws as accepting does. */
export async function dismissSuggestion(
  ctx: TeamContext,
  { params, body }: Named & { body: DismissSuggestion },
): Promise<{ decision: DecisionView }> {
  return ctx.db.transaction(async (tx) => {
    const campId = (await campFor(tx, ctx, { params })).row.id;
    const key = decoded(params.key ?? "");
    if (await decidedBefore(tx, ctx, campId, key, "dismissed"))
      return { decision: await decisionOn(tx, ctx, campId, key) };
    const { title } = await suggestionFor(tx, ctx, campId, key);
    const { reason } = body;
    return {
      decision: await record(tx, ctx, campId, { key, title, decision: "dismissed", reason, revision: null }),
    };
  });
}
