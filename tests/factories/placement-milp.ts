import type { PlacementProblem } from "@/lib/engine";
import { exclude } from "./placement";

type Pair = PlacementProblem["candidates"][number];

/** Per candidate, those of other items on other days that an `apart` rule keeps it from: every pair is looked at. */
function keptApart(problem: PlacementProblem): readonly ReadonlySet<number>[] {
  const { candidates } = problem;
  const sets = candidates.map(() => new Set<number>());
  // Only pairs whose starts are nearer than the widest rule and the longest session can exclude one another.
  const reach = Math.max(0, ...problem.apart.map(({ minutes }) => minutes));
  const longest = candidates.reduce((most, { startsAt, endsAt }) => Math.max(most, endsAt - startsAt), 0);
  const byStart = candidates.map((candidate, index) => ({ candidate, index }));
  byStart.sort((a, b) => a.candidate.startsAt - b.candidate.startsAt);
  const differ = (a: Pair, b: Pair): boolean => a.item !== b.item && a.day !== b.day;
  byStart.forEach(({ candidate: a, index }, at) => {
    for (let next = at + 1; next < byStart.length; next++) {
      const other = byStart[next];
      if (!other || other.candidate.startsAt - a.startsAt > reach + longest) break;
      if (!differ(a, other.candidate) || !exclude(problem, a, other.candidate)) continue;
      sets[index]?.add(other.index);
      sets[other.index]?.add(index);
    }
  });
  return sets;
}

/**
 * Candidates that have to be in the MILP. One may be left out where another of the same item and day costs no more and is
 * kept from nothing that the first is not kept from: in any choice it can take the first one's place, since spread and
 * free days ask for the day only. So the least cost stays the same.
 */
function needed(problem: PlacementProblem, apart: readonly ReadonlySet<number>[]): readonly number[] {
  const groups = new Map<string, number[]>();
  problem.candidates.forEach(({ item, day }, index) => {
    const key = `${item} ${day}`;
    groups.set(key, [...(groups.get(key) ?? []), index]);
  });
  const cost = (index: number): number => problem.candidates[index]?.cost ?? 0;
  const setOf = (index: number): ReadonlySet<number> => apart[index] ?? new Set();
  return [...groups.values()].flatMap((group) => {
    const kept: number[] = [];
    for (const index of group.sort((a, b) => cost(a) - cost(b) || setOf(a).size - setOf(b).size)) {
      if (!kept.some((other) => [...setOf(other)].every((one) => setOf(index).has(one)))) kept.push(index);
    }
    return kept;
  });
}

const LINE = 8;

/** Terms of a row, a few to a line, since readers of the format limit the length of lines. */
function sum(terms: readonly string[]): string {
  const lines: string[] = [];
  for (let at = 0; at < terms.length; at += LINE) lines.push(terms.slice(at, at + LINE).join(" + "));
  return lines.join("\n + ");
}

/**
 * The problem as a mixed-integer program in LP format, written from the value's own words and sharing nothing with the solver.
 * `whole` keeps also the candidates that a look at the value shows to be beaten: what a solver without that look is given.
 * `x`: candidate chosen; `u`: item left out; `z`: both days of a pair have a lift; `r`: lifting takes all free days of a week.
 */
export function milpOf(problem: PlacementProblem, { whole = false } = {}): string {
  const { items, candidates, spread, weekly } = problem;
  const apart = keptApart(problem);
  const used = whole ? candidates.map((_, index) => index) : needed(problem, apart);
  const isUsed = new Set(used);
  const byItem = new Map<number, number[]>(items.map((_, item) => [item, []]));
  const byDay = new Map<number, number[]>();
  for (const index of used) {
    const candidate = candidates[index];
    if (!candidate) continue;
    byItem.get(candidate.item)?.push(index);
    byDay.set(candidate.day, [...(byDay.get(candidate.day) ?? []), index]);
  }
  const x = (index: number): string => `x${index}`;
  const objective: string[] = used.map((index) => `${candidates[index]?.cost ?? 0} ${x(index)}`);
  const rows: string[] = [];

  for (const [item, own] of byItem) {
    objective.push(`${items[item]?.unplaced ?? 0} u${item}`);
    rows.push(`${sum([...own.map(x), `u${item}`])} = 1`);
  }
  for (const own of byDay.values()) if (own.length > 1) rows.push(`${sum(own.map(x))} <= 1`);

  for (const index of used) {
    // An item is chosen once at most, so all its candidates that exclude one other fit in one row.
    const others = new Map<number, number[]>();
    for (const other of apart[index] ?? []) {
      const item = candidates[other]?.item ?? -1;
      if (isUsed.has(other) && item > (candidates[index]?.item ?? -1))
        others.set(item, [...(others.get(item) ?? []), other]);
    }
    for (const list of others.values()) rows.push(`${sum([index, ...list].map(x))} <= 1`);
  }

  const days = [...byDay.keys()].sort((a, b) => a - b);
  for (const day of days) {
    spread.forEach((cost, index) => {
      const other = byDay.get(day + index + 1);
      if (!other || cost === 0) return;
      objective.push(`${cost} z${day}_${index}`);
      rows.push(`${sum([...(byDay.get(day) ?? []), ...other].map(x))} - z${day}_${index} <= 1`);
    });
  }

  weekly.forEach(({ freeDays, noRestCost }, index) => {
    const taken = freeDays.flatMap((day) => byDay.get(day) ?? []);
    objective.push(`${noRestCost} r${index}`);
    rows.push(
      taken.length > 0
        ? `${sum(taken.map(x))} - r${index} <= ${freeDays.length - 1}`
        : `r${index} >= ${freeDays.length === 0 ? 1 : 0}`,
    );
  });

  const named = rows.map((row, index) => ` c${index}: ${row}`);
  const binaries = used.length > 0 ? `Binary\n ${used.map(x).join("\n ")}\n` : "";
  return `Minimize\n obj: ${sum(objective)}\nSubject To\n${named.join("\n")}\n${binaries}End\n`;
}

/** The choice that a solution of `milpOf` stands for. `value`: of a column by name. */
export function choiceOf(problem: PlacementProblem, value: (column: string) => number): (number | null)[] {
  const chosen: (number | null)[] = problem.items.map(() => null);
  problem.candidates.forEach(({ item }, index) => {
    if (value(`x${index}`) > 0.5) chosen[item] = index;
  });
  return chosen;
}
