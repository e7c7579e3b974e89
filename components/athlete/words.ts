import { LIMITATION_WORDS } from "@/components/exercises/words";
import type { Limitation } from "@/lib/engine/prescription/exercise";

/** "2 camps were planned again." */
export function replannedText(count: number): string {
  if (count === 0) return "No camp had to change.";
  return count === 1 ? "One camp was planned again." : `${count} camps were planned again.`;
}

const day = new Intl.DateTimeFormat("en-GB", {
  day: "numeric",
  month: "short",
  year: "numeric",
  timeZone: "UTC",
});
/** "5 Dec 2026" of YYYY-MM-DD or of an instant, in UTC. */
export const dateText = (date: string): string => day.format(new Date(date));

/** "From 5 Dec 2026 until a medic lifts it". */
export const holdSpan = ({ from, to }: { readonly from: string; readonly to: string | null }): string =>
  to === null
    ? `From ${dateText(from)} until a medic lifts it`
    : from === to
      ? `On ${dateText(from)}`
      : `From ${dateText(from)} to ${dateText(to)}`;

/** "Ankle; Knee: no deep bend", or "" where there is none. */
export const codesText = (codes: readonly Limitation[]): string =>
  codes.map((code) => LIMITATION_WORDS[code]).join("; ");
