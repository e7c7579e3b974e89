import { TEST_SPECS } from "@/lib/engine/measures/test-kinds";
import { massText, type MassUnit } from "@/lib/format/load";
import type { SideDifference, TestSeries } from "@/lib/schemas/test-trial";

export const SIDE_WORDS = { both: "both sides", left: "left", right: "right" } as const;

/** "Loaded jump, 20 kg, left". */
export function seriesTitle(
  { kind, at }: Pick<TestSeries | SideDifference, "kind" | "at">,
  unit: MassUnit,
  side?: TestSeries["side"],
): string {
  const load = at === null ? null : massText(at, unit);
  return [TEST_SPECS[kind].title, load, side && side !== "both" ? SIDE_WORDS[side] : null]
    .filter(Boolean)
    .join(", ");
}
