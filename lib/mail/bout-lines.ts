import { TZDate } from "@date-fns/tz";
import { formatInstant, formatLongDay, formatTime } from "@/lib/format/dates";
import type { CampBook } from "@/lib/schemas/camp-book";

/** The instant of a civil date and time in a zone. */
function dateOf(date: string, time: string, zone: string): Date {
  const [year = 0, month = 1, day = 1] = date.split("-").map(Number);
  const [hour = 0, minute = 0] = time.split(":").map(Number);
  return new Date(new TZDate(year, month - 1, day, hour, minute, zone).getTime());
}

/** A time at the venue, read by someone who may live by another clock. */
function venueText(date: string, time: string, zone: string, readerZone: string): string {
  const at = dateOf(date, time, zone);
  const read = `${formatLongDay(at, readerZone)} ${formatTime(at, readerZone)}`;
  return formatInstant(at, readerZone) === formatInstant(at, zone)
    ? read
    : `${read} (${formatInstant(at, zone)} at the venue)`;
}

const boutText = ({ bout }: CampBook, readerZone: string): string =>
  venueText(bout.date, bout.time, bout.timeZone, readerZone);

const weighInText = ({ bout, weighIn }: CampBook, readerZone: string): string =>
  weighIn ? venueText(weighIn.date, weighIn.time, bout.timeZone, readerZone) : "not set";

/** What became of the bout between two states of a camp, in lines; none where nothing did. */
export function boutLines(before: CampBook, after: CampBook, readerZone: string): string[] {
  if (after.status === "off")
    return before.status === "off" ? [] : [`The bout of ${boutText(before, readerZone)} is off.`];
  const compare = (label: string, was: string, is: string): string[] =>
    was === is ? [] : [`${label}: ${was || "open"} → ${is || "open"}`];
  return [
    ...(before.status === "off"
      ? [`The bout is on: ${boutText(after, readerZone)}.`]
      : compare("Bout", boutText(before, readerZone), boutText(after, readerZone))),
    ...compare("Weigh-in", weighInText(before, readerZone), weighInText(after, readerZone)),
    ...compare("Place", before.bout.place, after.bout.place),
    ...compare("Opponent", before.bout.opponent, after.bout.opponent),
  ];
}
