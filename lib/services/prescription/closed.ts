import type { LogWithSets } from "@/db/queries/logs";
import type { LoadedCamp } from "@/lib/services/camps/load";
import type { SessionRow } from "@/lib/services/logs/session-for";

const LOGGED = {
  open: "The athlete has begun to log it: what was asked stands.",
  done: "It was logged as done: what was asked stands.",
  missed: "It was logged as missed: what was asked stands.",
} as const;

/** Why nothing of a lifting session can be changed any more, in words; null where it can. */
export function whyClosed(
  { row }: Pick<LoadedCamp, "row">,
  session: Pick<SessionRow, "status">,
  log: LogWithSets | null,
): string | null {
  if (log) return LOGGED[log.log.state];
  if (session.status === "cancelled") return "It was taken out of the plan.";
  return row.status === "off" ? "The bout is off." : null;
}
