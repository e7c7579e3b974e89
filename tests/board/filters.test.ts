import { describe, expect, it } from "vitest";
import { NO_FILTERS, filtersOf, queryOf, rowAfterKey, shownRows } from "@/components/board/filters";
import { waitingText } from "@/components/suggestions/waiting-text";
import { effectText, numberText } from "@/components/suggestions/words";
import type { KnockOn } from "@/lib/engine";
import type { BoardRow } from "@/lib/schemas/board";

/** Invented athletes. */
const row = (name: string, daysOut: number, over: Partial<BoardRow> = {}): BoardRow => ({
  campId: name,
  athlete: { id: name, name },
  bout: { date: "2027-01-09", opponent: "Petra Holm-Aziz", place: "" },
  daysOut,
  phase: "strength",
  fightWeek: daysOut < 7,
  onHold: false,
  today: "2026-12-01",
  days: [],
  attendance: null,
  load: null,
  flags: [],
  requests: [],
  ...over,
});
const flag = (text: string) => ({ kind: "pain", text }) as const;
const ROWS = [
  row("Ilse Marrow", 40, { flags: [flag("a")] }),
  row("Zoë Ádám", 3, { flags: [flag("a"), flag("b")] }),
  row("Bram Oduya", 12, { onHold: true }),
];
const names = (filters: Partial<typeof NO_FILTERS>): string[] =>
  shownRows(ROWS, { ...NO_FILTERS, ...filters }).map(({ athlete }) => athlete.name);

describe("the board's filters", () => {
  it("are the same after a way through the address bar, and an empty address is no filter", () => {
    const all = { search: "zo", flagged: true, fightWeek: true, onHold: true, sort: "flags" } as const;
    expect(filtersOf(new URLSearchParams(queryOf(all)))).toEqual(all);
    expect(queryOf(all)).toBe("find=zo&only=flagged,fight-week,hold&sort=flags");
    expect(queryOf(NO_FILTERS)).toBe("");
    expect(filtersOf(new URLSearchParams("sort=oldest&only=everything"))).toEqual(NO_FILTERS);
  });

  it("put the nearest bout first, or order by name, or by the number of flags", () => {
    expect(names({})).toEqual(["Zoë Ádám", "Bram Oduya", "Ilse Marrow"]);
    expect(names({ sort: "name" })).toEqual(["Bram Oduya", "Ilse Marrow", "Zoë Ádám"]);
    expect(names({ sort: "flags" })).toEqual(["Zoë Ádám", "Ilse Marrow", "Bram Oduya"]);
  });

  it("keep who is flagged, in fight week or on a hold; together they all must hold", () => {
    expect(names({ flagged: true })).toEqual(["Zoë Ádám", "Ilse Marrow"]);
    expect(names({ fightWeek: true })).toEqual(["Zoë Ádám"]);
    expect(names({ onHold: true })).toEqual(["Bram Oduya"]);
    expect(names({ onHold: true, flagged: true })).toEqual([]);
  });

  it("find by name or opponent, without marks and capitals", () => {
    expect(names({ search: "adam ZOE" })).toEqual(["Zoë Ádám"]);
    expect(names({ search: "holm" })).toHaveLength(3);
    expect(names({ search: "nobody" })).toEqual([]);
  });

  it("leave the rows they were given as they are", () => {
    const before = [...ROWS];
    names({ sort: "name" });
    expect(ROWS).toEqual(before);
  });
});

describe("keys on the board", () => {
  it("walk between rows and stop at both ends", () => {
    expect(rowAfterKey("ArrowDown", 0, 3)).toBe(1);
    expect(rowAfterKey("ArrowDown", 2, 3)).toBe(2);
    expect(rowAfterKey("ArrowUp", 0, 3)).toBe(0);
    expect(rowAfterKey("End", 0, 3)).toBe(2);
    expect(rowAfterKey("Home", 2, 3)).toBe(0);
  });
  it("leave every other key to the page", () => {
    expect(rowAfterKey("Enter", 0, 3)).toBeNull();
    expect(rowAfterKey("ArrowDown", 0, 0)).toBeNull();
  });
});

describe("words of a suggestion", () => {
  const knockOn: KnockOn = { lifts: [], sport: [], weeks: [], violations: [], bout: null };
  const over = { kind: "days", from: "2026-12-06", to: "2026-12-13" } as const;
  const effect = { over, factor: 0.85, lifts: 5, setsBefore: 62, setsAfter: 53, knockOn };

  it("say what it would change in one line", () => {
    expect(effectText(effect)).toBe("Lowers 5 sessions by 15 %: 62 to 53 sets until Sun 13 Dec.");
    expect(effectText({ ...effect, lifts: 0 })).toBe("As things stand it changes no session.");
    const lift = { kind: "lift", title: "Strength A", date: "2026-12-07" } as const;
    expect(effectText({ ...effect, over: lift, factor: 0.8, lifts: 1, setsBefore: 12, setsAfter: 10 })).toBe(
      "Sets Strength A on Mon 7 Dec to × 0.80: 12 to 10 sets.",
    );
  });

  it("give numbers with their units, weights in the reader's", () => {
    expect(numberText({ label: "", value: 2130.4, unit: "AU" }, "kg")).toBe("2,130 AU");
    expect(numberText({ label: "", value: 64.2, unit: "kg" }, "kg")).toBe("64.2 kg");
    expect(numberText({ label: "", value: 64.2, unit: "kg" }, "lb")).toBe("141.5 lb");
    expect(numberText({ label: "", value: 5, unit: "of 10" }, "kg")).toBe("5 of 10");
  });

  it("count what waits, and are silent where nothing does", () => {
    const some = (count: number) => Array.from({ length: count }, () => ({})) as never[];
    expect(waitingText({ suggestions: some(2), requests: some(1) })).toBe("2 suggestions, 1 request");
    expect(waitingText({ suggestions: [], requests: [] })).toBe("");
  });
});
