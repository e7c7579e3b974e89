import type { LoadedCamp } from "@/lib/services/camps/load";
import { dayFromIso, minuteFromHhmm } from "@/lib/engine";
import { notFound } from "@/lib/errors";
import { dayText, momentText } from "@/lib/format/civil";

export type SessionRow = LoadedCamp["sessions"][number];

/** An id as it stood in a path: "@" and the like may come escaped. */
export const decoded = (text: string): string => {
  try {
    return decodeURIComponent(text);
  } catch {
    return text;
  }
};

/** The session of a camp that a path names. */
export function sessionIn(camp: Pick<LoadedCamp, "sessions">, sid: string | undefined): SessionRow {
  const id = sid ?? "";
  const found =
    camp.sessions.find((row) => row.id === id) ?? camp.sessions.find((row) => row.id === decoded(id));
  if (!found) throw notFound();
  return found;
}

/** "Hard sparring on Sat 5 Dec". */
export const sessionOnDay = ({ title, day }: Pick<SessionRow, "title" | "day">): string =>
  `${title} on ${dayText(dayFromIso(day))}`;

/** "Hard sparring on Sat 5 Dec 18:00". */
export const sessionAt = ({ title, day, start }: Pick<SessionRow, "title" | "day" | "start">): string =>
  `${title} on ${momentText({ day: dayFromIso(day), start: minuteFromHhmm(start) })}`;
