import { ITEM_LOOKS, weekTitle } from "@/components/session/kinds";
import { Notice } from "@/components/ui/notice";
import type { Plan, Unplaced } from "@/lib/engine/types";
import { dayText } from "@/lib/format/civil";

/** More lines than these are folded: the camp stays in sight. */
const SHOWN = 3;

const unplacedText = (unplaced: Unplaced): string => {
  const because = unplaced.rules[0]?.text;
  return `${ITEM_LOOKS[unplaced.item].label}, ${weekTitle(unplaced.week).toLowerCase()}: no room. ${because ?? ""}`;
};

/** What the planner could not do, in words: sessions without room, and rules that the week itself breaks. */
export function StartRemarks({ plan }: { readonly plan: Plan }) {
  const unplaced = plan.unplaced.filter((left) => left.rules[0]?.rule !== "past");
  const lines = [
    ...unplaced.map(unplacedText),
    ...plan.violations.map((violation) => `${dayText(violation.day)}: ${violation.text}`),
  ];
  if (lines.length === 0) return null;
  const list = (shown: readonly string[]) => (
    <ul className="mt-1 grid gap-1">
      {shown.map((line, index) => (
        <li key={`${index} ${line}`}>{line}</li>
      ))}
    </ul>
  );
  return (
    <Notice
      tone="caution"
      title={lines.length === 1 ? "One thing does not fit" : `${lines.length} things do not fit`}
      className="mt-3"
    >
      {list(lines.slice(0, SHOWN))}
      {lines.length > SHOWN ? (
        <details className="mt-1">
          <summary className="flex min-h-control-small items-center font-semibold underline underline-offset-4">
            {lines.length - SHOWN} more
          </summary>
          {list(lines.slice(SHOWN))}
        </details>
      ) : null}
    </Notice>
  );
}
