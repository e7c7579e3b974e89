import { ITEM_LOOKS, weekTitle } from "@/components/session/kinds";
import type { Plan, Unplaced, Violation } from "@/lib/engine/types";
import { dayText } from "@/lib/format/civil";

function groupsOf<T>(all: readonly T[], keyOf: (one: T) => string): [T, ...T[]][] {
  const groups = new Map<string, [T, ...T[]]>();
  for (const one of all) {
    const group = groups.get(keyOf(one));
    if (group) group.push(one);
    else groups.set(keyOf(one), [one]);
  }
  return [...groups.values()];
}

function unplacedLine([first, ...more]: [Unplaced, ...Unplaced[]]): string {
  const where = more.length === 0 ? weekTitle(first.week).toLowerCase() : `in ${more.length + 1} weeks`;
  const because = first.rules[0]?.text;
  return `${ITEM_LOOKS[first.item].label}, ${where}: no room.${because ? ` ${because}` : ""}`;
}

function violationLine([first, ...more]: [Violation, ...Violation[]]): string {
  const times = more.length === 0 ? "" : `, and ${more.length} more like it`;
  return `${dayText(first.day)}${times}: ${first.text}`;
}

/**
 * What a plan could not do, one line a kind: sessions without room, and rules that the week itself breaks. Weeks that
 * are over are no news.
 */
export function remarkLines(plan: Plan): string[] {
  const left = plan.unplaced.filter((unplaced) => unplaced.rules[0]?.rule !== "past");
  return [
    ...groupsOf(left, ({ item, rules }) => `${item} ${rules[0]?.rule ?? ""}`).map(unplacedLine),
    ...groupsOf(plan.violations, ({ rule }) => rule).map(violationLine),
  ];
}
