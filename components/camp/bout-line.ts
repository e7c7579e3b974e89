import { dayFromIso } from "@/lib/engine/geometry";
import type { Day } from "@/lib/engine/types";
import { dayText, longDayText } from "@/lib/format/civil";
import type { CampBook } from "@/lib/schemas/camp-book";

const zoneCity = (zone: string): string => (zone.split("/").at(-1) ?? zone).replaceAll("_", " ");

/** "kickboxing 3 × 3". */
function rulesText({ ruleset, rounds, roundMinutes }: CampBook["bout"]): string {
  const length =
    rounds !== null && roundMinutes !== null
      ? `${rounds} × ${roundMinutes}`
      : rounds !== null
        ? `${rounds} rounds`
        : "";
  return [ruleset, length].filter(Boolean).join(" ");
}

function weightText({ bout, weighIn }: CampBook): string {
  const limit = bout.limitKg === null ? "" : `${bout.limitKg} kg`;
  const scale = weighIn === null ? "" : `weigh-in ${dayText(dayFromIso(weighIn.date))} ${weighIn.time}`;
  return [limit, scale].filter(Boolean).join(", ");
}

/** The facts of a bout in one line: `when` is set in bold. */
export function boutLine(book: CampBook): { when: string; rest: string } {
  const { bout, homeZone, weeks } = book;
  const zone = bout.timeZone === homeZone ? "" : ` (${zoneCity(bout.timeZone)} time)`;
  const where = `, ${bout.time}${zone}${bout.place ? ` at ${bout.place}` : ""}`;
  const facts = [rulesText(bout), weightText(book), `${weeks}-week camp`].filter(Boolean);
  return { when: longDayText(dayFromIso(bout.date)), rest: [where, ...facts].join(" · ") };
}

/** The count of days and what it counts: "38", "days out". */
export function daysOutText(boutDay: Day, today: Day): { count: string; words: readonly [string, string] } {
  const out = boutDay - today;
  if (out === 0) return { count: "0", words: ["bout", "today"] };
  const noun = Math.abs(out) === 1 ? "day" : "days";
  return { count: String(Math.abs(out)), words: [noun, out > 0 ? "out" : "since"] };
}
