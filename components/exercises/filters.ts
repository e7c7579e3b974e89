import {
  EQUIPMENT,
  LIMITATIONS,
  QUALITIES,
  type Equipment,
  type Limitation,
  type Quality,
} from "@/lib/engine/prescription/exercise";
import type { ExerciseSummary } from "@/lib/schemas/exercise";
import { qualitiesText } from "./words";

/** What the list of exercises is narrowed by. */
export interface Filters {
  readonly search: string;
  readonly quality: Quality | null;
  /** What is there: exercises that need more are hidden. Null asks for nothing. */
  readonly equipment: readonly Equipment[] | null;
  /** Exercises that any of these rules out are hidden. */
  readonly limitations: readonly Limitation[];
  /** Only what the team added or changed. */
  readonly own: boolean;
  readonly shelved: boolean;
}

export const NO_FILTERS: Filters = {
  search: "",
  quality: null,
  equipment: null,
  limitations: [],
  own: false,
  shelved: false,
};

const known = <T extends string>(all: readonly T[], text: string | null): T[] => {
  const given = new Set(text?.split(",") ?? []);
  return all.filter((one) => given.has(one));
};

/** Filters as the address bar holds them; what it does not know is left out. */
export function filtersOf(query: URLSearchParams): Filters {
  return {
    search: query.get("find") ?? "",
    quality: known(QUALITIES, query.get("quality"))[0] ?? null,
    equipment: query.has("with") ? known(EQUIPMENT, query.get("with")) : null,
    limitations: known(LIMITATIONS, query.get("without")),
    own: query.get("own") === "1",
    shelved: query.get("shelved") === "1",
  };
}

/** The same as a query, "" where nothing is filtered. */
export function queryOf({ search, quality, equipment, limitations, own, shelved }: Filters): string {
  const query = new URLSearchParams();
  if (search.trim() !== "") query.set("find", search.trim());
  if (quality !== null) query.set("quality", quality);
  if (equipment !== null) query.set("with", equipment.join(","));
  if (limitations.length > 0) query.set("without", limitations.join(","));
  if (own) query.set("own", "1");
  if (shelved) query.set("shelved", "1");
  // Commas may stand in a query as they are (RFC 3986 section 3.4).
  return query.toString().replaceAll("%2C", ",");
}

const plain = (text: string): string => text.normalize("NFKD").replace(/\p{M}/gu, "").toLowerCase();

/** Whether an exercise stays in the list: every word of the search is in its name or in what it trains. */
export function passes({ exercise, origin, shelved }: ExerciseSummary, filters: Filters): boolean {
  const { search, quality, equipment, limitations, own } = filters;
  if (shelved && !filters.shelved) return false;
  if (own && origin === "library" && !shelved) return false;
  if (quality !== null && !exercise.qualities.includes(quality)) return false;
  if (equipment !== null && !exercise.equipment.every((piece) => equipment.includes(piece))) return false;
  if (limitations.some((limitation) => exercise.ruledOutBy.includes(limitation))) return false;
  const text = plain(`${exercise.name} ${qualitiesText(exercise.qualities)}`);
  return plain(search)
    .split(/\s+/)
    .every((word) => text.includes(word));
}
