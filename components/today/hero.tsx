import { dayFromIso } from "@/lib/engine/geometry";
import { dayText } from "@/lib/format/civil";
import { massText } from "@/lib/format/load";
import type { TodayView } from "@/lib/schemas/today";

interface HeroProps {
  readonly view: TodayView;
  readonly date: string;
}

function countOf(bout: string, date: string): { count: string; words: readonly [string, string] } {
  const out = dayFromIso(bout) - dayFromIso(date);
  if (out === 0) return { count: "0", words: ["bout", "today"] };
  return {
    count: String(Math.abs(out)),
    words: [Math.abs(out) === 1 ? "day" : "days", out > 0 ? "out" : "since"],
  };
}

/** Days out, the one ornament, and the bout it counts to. */
export function Hero({ view, date }: HeroProps) {
  const { bout, unit } = view;
  if (!bout)
    return (
      <header className="px-4.5 pb-4">
        <h1 className="text-xl font-semibold">{view.athlete.name}</h1>
        <p className="mt-1 text-sm text-bar-quiet">No bout is set. Your coach sets one.</p>
      </header>
    );
  const { count, words } = countOf(bout.date, date);
  const limit = bout.limitKg === null ? "" : massText(bout.limitKg, unit);
  return (
    <header className="flex items-end justify-between gap-3 px-4.5">
      <h1 className="flex items-end gap-2.5">
        <span className="font-display text-[104px] leading-[0.8]">{count}</span>
        <span className="font-display text-[22px] leading-[0.95] text-bar-quiet uppercase">
          {words[0]}
          <br />
          {words[1]}
        </span>
      </h1>
      <p className="text-right text-sm text-bar-quiet">
        {dayText(dayFromIso(bout.date))}, {bout.time}
        <br />
        {[limit, bout.place].filter(Boolean).join(" · ")}
      </p>
    </header>
  );
}
