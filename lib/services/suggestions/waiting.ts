import { findBoardFrame, listBoardCamps, listBoardRequests, listDecidedKeys } from "@/db/queries/board";
import { listDecisions } from "@/db/queries/suggestions";
import type { Tx } from "@/db/client";
import { changeOfSuggestion, isPreview, previewChange } from "@/lib/book";
import { instantOf } from "@/lib/calendar/zones";
import { isoFromDay, suggestions } from "@/lib/engine";
import type { KnockOn, Suggestion } from "@/lib/engine";
import { AppError, notFound } from "@/lib/errors";
import { can } from "@/lib/policy";
import type { DecisionView, SuggestionEffect, SuggestionView, WaitingView } from "@/lib/schemas/suggestion";
import { undecided } from "@/lib/services/board/flags";
import { waitingRequest } from "@/lib/services/board/waiting-request";
import { loadCamp, type LoadedCamp } from "@/lib/services/camps/load";
import type { TeamContext } from "@/lib/services/context";
import { readAnswers, seesOf } from "./answers";
import { responseInputOf } from "./response-input";

type DecisionRow = Awaited<ReturnType<typeof listDecisions>>[number];

export const decisionView = (row: DecisionRow): DecisionView => ({
  key: row.key,
  decision: row.decision,
  title: row.title,
  reason: row.reason,
  revision: row.revision,
  putBackBy: row.putBackBy,
  by: row.by ?? "Someone who left the team",
  at: row.at.toISOString(),
});

/** What the engine suggests for a camp that is on, and nobody has decided on. */
export async function suggestionsFor(tx: Tx, ctx: TeamContext, campId: string) {
  const scope = { campId };
  const [frame, [camp], decided] = await Promise.all([
    findBoardFrame(tx, ctx.teamId, ctx.userId),
    listBoardCamps(tx, ctx.teamId, scope),
    listDecidedKeys(tx, ctx.teamId, scope),
  ]);
  if (!frame) throw notFound();
  const answersOf = await readAnswers(tx, ctx, frame, scope, seesOf(ctx));
  const keys = new Set(decided.map(({ key }) => key));
  const now = instantOf(ctx.now);
  const open = camp ? undecided(suggestions(responseInputOf(answersOf(camp), now)), camp, keys) : [];
  return { frame, open };
}

function setsOf({ lifts }: KnockOn): Pick<SuggestionEffect, "lifts" | "setsBefore" | "setsAfter"> {
  const sum = (values: readonly (number | null)[]): number =>
    values.reduce<number>((total, value) => total + (value ?? 0), 0);
  return {
    lifts: lifts.length,
    setsBefore: sum(lifts.map(({ setsBefore }) => setsBefore)),
    setsAfter: sum(lifts.map(({ setsAfter }) => setsAfter)),
  };
}

/** A suggestion with what accepting it would do, by the same planner that saving runs. */
function viewOf(suggestion: Suggestion, camp: LoadedCamp, now: Date): SuggestionView {
  const { key, kind, title, numbers, text, source, change } = suggestion;
  const said = { key, kind, title, numbers, text, source };
  const wanted = changeOfSuggestion(suggestion);
  if (change === null || wanted === null) return { ...said, effect: null, problem: null };
  const preview = previewChange(camp, wanted, instantOf(now));
  if (!isPreview(preview))
    return { ...said, effect: null, problem: preview.problems[0]?.message ?? "This change cannot be made." };
  const lift = change.kind === "factor" ? camp.sessions.find(({ id }) => id === change.liftId) : undefined;
  const over: SuggestionEffect["over"] =
    change.kind === "factor"
      ? { kind: "lift", title: lift?.title ?? "A lift", date: lift?.day ?? "" }
      : { kind: "days", from: isoFromDay(change.from), to: isoFromDay(change.to) };
  const { knockOn } = preview;
  return { ...said, effect: { over, factor: change.factor, ...setsOf(knockOn), knockOn }, problem: null };
}

/**
 * What of a camp waits for a coach: suggestions with their effect, requests, and what was decided. Nothing is changed by
 * reading it. Throws `forbidden` for those who may not decide.
 */
export async function listSuggestions(
  ctx: TeamContext,
  { params }: { params: Record<string, string> },
): Promise<WaitingView> {
  const camp = await loadCamp(ctx.db, ctx, params.id ?? "");
  if (!can(ctx.member, "suggestions.decide", camp.athlete.id))
    throw new AppError("forbidden", "Your role may not do this.");
  const { row } = camp;
  const [{ frame, open }, decisions, requests] = await Promise.all([
    suggestionsFor(ctx.db, ctx, row.id),
    listDecisions(ctx.db, ctx.teamId, row.id),
    can(ctx.member, "requests.answer", camp.athlete.id)
      ? listBoardRequests(ctx.db, ctx.teamId, { campId: row.id }, { from: row.boutDate })
      : [],
  ]);
  return {
    revision: row.revision,
    unit: frame.unit,
    suggestions: open.map((suggestion) => viewOf(suggestion, camp, ctx.now)),
    decisions: decisions.map(decisionView),
    requests: requests.filter(({ state }) => state === "asked").map(waitingRequest),
  };
}
