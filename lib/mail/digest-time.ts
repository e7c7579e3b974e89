import { TZDate } from "@date-fns/tz";
import { addDays, set } from "date-fns";

/** Wall-clock hour of the daily mail in the reader's zone. */
const DIGEST_HOUR = 6;

/** First 06:00 of `timeZone` after `now`. Where a clock change skips 06:00, the time that the clock jumps to. */
export function nextDigest(now: Date, timeZone: string): Date {
  const local = new TZDate(now.getTime(), timeZone);
  const today = set(local, { hours: DIGEST_HOUR, minutes: 0, seconds: 0, milliseconds: 0 });
  const next =
    today.getTime() > now.getTime()
      ? today
      : set(addDays(local, 1), { hours: DIGEST_HOUR, minutes: 0, seconds: 0, milliseconds: 0 });
  return new Date(next.getTime());
}
