import { isoFromDay } from "@/lib/engine";
import type { Suggestion } from "@/lib/engine";
import type { Change } from "@/lib/schemas/change";

/**
 * What accepting a suggestion does to the camp book, for the preview and for saving; null for one that is a talk. Its key is
 * the id of the response, so that accepting it twice is accepting it once.
 */
export function changeOfSuggestion({
  key,
  title,
  change,
}: Suggestion): Exclude<Change, { kind: "put-back" }> | null {
  if (change === null) return null;
  if (change.kind === "factor") return { kind: "lift.factor", liftId: change.liftId, factor: change.factor };
  const { from, to, factor } = change;
  return {
    kind: "response.add",
    id: key,
    from: isoFromDay(from),
    to: isoFromDay(to),
    factor,
    because: title,
  };
}
