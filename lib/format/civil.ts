import { hhmm, isoFromDay } from "@/lib/engine/geometry";
import type { Day, Minute } from "@/lib/engine/types";

const short = new Intl.DateTimeFormat("en-GB", {
  weekday: "short",
  day: "numeric",
  month: "short",
  timeZone: "UTC",
});
const long = new Intl.DateTimeFormat("en-GB", {
  weekday: "short",
  day: "numeric",
  month: "long",
  year: "numeric",
  timeZone: "UTC",
});

/** "Sat 5 Dec". */
export const dayText = (day: Day): string =>
  short.format(new Date(`${isoFromDay(day)}T00:00:00Z`)).replace(",", "");

/** "Sat 9 January 2027". */
export const longDayText = (day: Day): string =>
  long.format(new Date(`${isoFromDay(day)}T00:00:00Z`)).replace(",", "");

/** "Sat 5 Dec 18:00". */
export const momentText = ({ day, start }: { day: Day; start: Minute }): string =>
  `${dayText(day)} ${hhmm(start)}`;
