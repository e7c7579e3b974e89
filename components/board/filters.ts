import type { BoardRow } from "@/lib/schemas/board";

export const SORTS = ["days-out", "name", "flags"] as const;
export type Sort = (typeof SORTS)[number];

/** What the board is narrowed by, and its order. */
export interface BoardFilters {
  readonly search: string;
  readonly flagged: boolean;
  readonly fightWeek: boolean;
  readonly onHold: boolean;
  readonly sort: Sort;
}

export const NO_FILTERS: BoardFilters = {
  search: "",
  flagged: false,
  fightWeek: false,
  onHold: false,
  sort: "days-out",
};

/** Filters as the address bar holds them; what it does not know is left out. */
export function filtersOf(query: URLSearchParams): BoardFilters {
  const only = new Set(query.get("only")?.split(",") ?? []);
  return {
    search: query.get("find") ?? "",
    flagged: only.has("flagged"),
    fightWeek: only.has("fight-week"),
    onHold: only.has("hold"),
    sort: SORTS.find((sort) => sort === query.get("sort")) ?? "days-out",
  };
}

/** The same as a query, "" where nothing is filtered and the order is the usual one. */
export function queryOf({ search, flagged, fightWeek, onHold, sort }: BoardFilters): string {
  const query = new URLSearchParams();
  const only = [
    ...(flagged ? ["flagged"] : []),
    ...(fightWeek ? ["fight-week"] : []),
    ...(onHold ? ["hold"] : []),
  ];
  if (search.trim() !== "") query.set("find", search.trim());
  if (only.length > 0) query.set("only", only.join(","));
  if (sort !== "days-out") query.set("sort", sort);
  // Commas may stand in a query as they are (RFC 3986 section 3.4).
  return query.toString().replaceAll("%2C", ",");
}

const plain = (text: string): string => text.normalize("NFKD").replace(/\p{M}/gu, "").toLowerCase();

const passes = (row: BoardRow, { search, flagged, fightWeek, onHold }: BoardFilters): boolean =>
  (!flagged || row.flags.length > 0) &&
  (!fightWeek || row.fightWeek) &&
  (!onHold || row.onHold) &&
  plain(search)
    .split(/\s+/)
    .every((word) => plain(`${row.athlete.name} ${row.bout.opponent}`).includes(word));

const byName = (a: BoardRow, b: BoardRow): number =>
  a.athlete.name.localeCompare(b.athlete.name) || a.daysOut - b.daysOut;
const ORDER: Readonly<Record<Sort, (a: BoardRow, b: BoardRow) => number>> = {
  "days-out": (a, b) => a.daysOut - b.daysOut || byName(a, b),
  name: byName,
  flags: (a, b) => b.flags.length - a.flags.length || a.daysOut - b.daysOut || byName(a, b),
};

/** The rows that are left, in the order asked for; every word of the search is in the athlete's or the opponent's name. */
export const shownRows = (rows: readonly BoardRow[], filters: BoardFilters): BoardRow[] =>
  rows.filter((row) => passes(row, filters)).sort(ORDER[filters.sort]);

/** The row that a key leads to, by index; null where the key is none of the board's. */
export function rowAfterKey(key: string, at: number, count: number): number | null {
  if (count === 0) return null;
  switch (key) {
    case "ArrowDown":
      return Math.min(count - 1, at + 1);
    case "ArrowUp":
      return Math.max(0, at - 1);
    case "Home":
      return 0;
    case "End":
      return count - 1;
    default:
      return null;
  }
}
