import { ITEM_LOOKS, weekTitle } from "@/components/session/kinds";
import type { Plan, SportSession } from "@/lib/engine/types";
import { dayText } from "@/lib/format/civil";

interface CampRemarksProps {
  readonly plan: Plan;
  readonly sport: readonly SportSession[];
  readonly onOpen: (sessionId: string) => void;
}

const TITLE = "text-sm font-semibold";

/** What the plan could not do, and the rules it breaks, in words. What had no room because it is past is no news. */
export function CampRemarks({ plan, sport, onOpen }: CampRemarksProps) {
  const unplaced = plan.unplaced.filter((left) => left.rules[0]?.rule !== "past");
  const known = new Set([...plan.lifts.map((lift) => lift.id), ...sport.map((session) => session.id)]);
  if (unplaced.length + plan.violations.length === 0) {
    return <p className="text-sm text-ink-2">Every lift has its place, and no rule is broken.</p>;
  }
  return (
    <div className="grid gap-3 text-sm">
      {unplaced.length > 0 ? (
        <section>
          <h3 className={TITLE}>
            {unplaced.length === 1 ? "One lift has no place" : `${unplaced.length} lifts have no place`}
          </h3>
          <ul className="mt-1 grid gap-1.5 text-ink-2">
            {unplaced.map((left) => (
              <li key={left.id}>
                <b className="font-semibold text-ink">{ITEM_LOOKS[left.item].label}</b>,{" "}
                {weekTitle(left.week).toLowerCase()}. {left.rules[0]?.text}
              </li>
            ))}
          </ul>
        </section>
      ) : null}
      {plan.violations.length > 0 ? (
        <section>
          <h3 className={TITLE}>
            {plan.violations.length === 1
              ? "One rule is broken"
              : `${plan.violations.length} rules are broken`}
          </h3>
          <ul className="mt-1 grid gap-1.5 text-ink-2">
            {plan.violations.map((violation) => {
              const open = violation.ids.find((id) => known.has(id));
              return (
                <li key={`${violation.rule} ${violation.ids.join(" ")}`}>
                  <b className="font-semibold text-ink">{dayText(violation.day)}</b>: {violation.text}{" "}
                  {open ? (
                    <button
                      type="button"
                      className="rounded font-semibold text-ink underline underline-offset-4"
                      onClick={() => onOpen(open)}
                    >
                      Show it
                    </button>
                  ) : null}
                </li>
              );
            })}
          </ul>
        </section>
      ) : null}
    </div>
  );
}
