import { PHASE_LOOKS } from "@/components/session/kinds";
import { classNames } from "@/components/ui/class-names";
import type { Day, Plan } from "@/lib/engine/types";
import { dayPercent, type RopeDays } from "./geometry";

interface Band {
  readonly from: Day;
  readonly to: Day;
  readonly label: string;
  readonly bar: string;
}

/** Phases of the camp, fight week in red at its end. */
function bandsOf({ phases, weeks, bout }: Plan): Band[] {
  const fight = weeks.find((week) => week.weeksOut === 0)?.from ?? bout.day;
  return [
    ...phases
      .filter((span) => span.from < fight)
      .map((span) => ({
        ...PHASE_LOOKS[span.phase],
        from: span.from,
        to: Math.min(span.to, fight - 1) as Day,
      })),
    { from: fight, to: bout.day, label: "Fight week", bar: "bg-red" },
  ];
}

export function PhaseBand({ plan, days }: { readonly plan: Plan; readonly days: RopeDays }) {
  return (
    <div className="mt-1 md:pl-24">
      <ol aria-label="Phases" className="relative h-6">
        {bandsOf(plan).map((band) => (
          <li
            key={band.from}
            className="absolute top-0 overflow-hidden pr-0.5 text-2xs text-ink-2"
            style={{
              left: `${dayPercent(days, band.from)}%`,
              width: `${dayPercent(days, band.to + 1) - dayPercent(days, band.from)}%`,
            }}
          >
            <span className={classNames("block h-2", band.bar)} />
            <span className="block truncate">{band.label}</span>
          </li>
        ))}
      </ol>
    </div>
  );
}
