"use client";

import { wireOf, type Entry } from "@/lib/offline/entry";
import type { Outcome } from "@/lib/offline/flush";
import type { LogView } from "@/lib/schemas/today";
import { ProblemError, sendJson, type Problem } from "./send";

/** A refusal that says nothing about the write itself: it is tried again later. */
const passing = (status: number): boolean =>
  status === 0 || status === 408 || status === 425 || status === 429 || status >= 500;

/** The log in a refusal, where a write was refused for being older than that. */
const theirLog = (problem: Problem): LogView | null =>
  problem.status === 409
    ? ((problem as Problem & { readonly current?: LogView | null }).current ?? null)
    : null;

function outcomeOf({ problem, message }: ProblemError): Outcome {
  if (passing(problem.status)) return { is: "unreachable" };
  if (problem.status === 401) return { is: "signed-out" };
  const theirs = theirLog(problem);
  if (theirs) return { is: "stuck", stuck: { why: "stale", theirs } };
  return { is: "stuck", stuck: { why: "refused", text: message, errors: problem.errors ?? [] } };
}

/** Sends one write of an athlete and says what became of it. */
export async function deliver(entry: Entry): Promise<Outcome> {
  const { url, body, method } = wireOf(entry);
  try {
    const answer = await sendJson<Partial<LogView> | null>(url, body, method);
    return { is: "sent", version: entry.work.kind === "log" ? (answer?.version ?? null) : null };
  } catch (error) {
    if (error instanceof ProblemError) return outcomeOf(error);
    throw error;
  }
}
