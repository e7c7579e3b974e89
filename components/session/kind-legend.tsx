import type { Plan, SportSession } from "@/lib/engine/types";
import { KindMark } from "./kind-mark";
import { SPORT_LOOKS, WEIGH_IN_LOOK, liftLook, type Mark, type WorkLook } from "./kinds";

/** What a lift's mark means, whatever the single session is called. */
const LIFT_MARKS: Partial<Record<Mark, string>> = { square: "Strength", triangle: "Power", diamond: "Taper" };

type LegendEntry = Pick<WorkLook, "label" | "mark" | "text">;

/** Every mark that a camp shows, once. */
export function legendOf(plan: Plan, sport: readonly SportSession[], weighIn = false): LegendEntry[] {
  const entries: LegendEntry[] = [
    ...sport.map((session) => SPORT_LOOKS[session.kind]),
    ...plan.lifts.map((lift) => {
      const look = liftLook(lift.item, lift.phase);
      return { ...look, label: LIFT_MARKS[look.mark] ?? look.label };
    }),
    ...(weighIn ? [WEIGH_IN_LOOK] : []),
  ];
  return [...new Map(entries.map((entry) => [entry.mark, entry])).values()];
}

/** Marks and what they mean. */
export function KindLegend({ entries }: { readonly entries: readonly LegendEntry[] }) {
  return (
    <ul aria-label="Marks" className="flex flex-wrap gap-x-4 gap-y-1 text-xs text-ink-2">
      {entries.map((entry) => (
        <li key={entry.mark} className="flex items-center gap-1.5">
          <KindMark mark={entry.mark} size={10} className={entry.text} />
          {entry.label}
        </li>
      ))}
    </ul>
  );
}
