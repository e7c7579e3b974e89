/** Instants as a reader sees them: civil texts in a zone, 24 hours, week day first. One wording for pages and mails. */

const cache = new Map<string, Intl.DateTimeFormat>();

function formatOf(name: string, zone: string, options: Intl.DateTimeFormatOptions): Intl.DateTimeFormat {
  const key = `${name} ${zone}`;
  const known = cache.get(key);
  if (known) return known;
  const made = new Intl.DateTimeFormat("en-GB", { ...options, timeZone: zone });
  cache.set(key, made);
  return made;
}

/** "Sat 5 Dec". */
export const formatDay = (at: Date, zone: string): string =>
  formatOf("day", zone, { weekday: "short", day: "numeric", month: "short" }).format(at).replace(",", "");

/** "Sat 9 January 2027". */
export const formatLongDay = (at: Date, zone: string): string =>
  formatOf("long", zone, { weekday: "short", day: "numeric", month: "long", year: "numeric" })
    .format(at)
    .replace(",", "");

/** "18:00". */
export const formatTime = (at: Date, zone: string): string =>
  formatOf("time", zone, { hour: "2-digit", minute: "2-digit", hourCycle: "h23" }).format(at);

/** "Sat 5 Dec 18:00". */
export const formatInstant = (at: Date, zone: string): string =>
  `${formatDay(at, zone)} ${formatTime(at, zone)}`;
