import { createEvents, type EventAttributes } from "ics";
import { cleanText, escapeText, foldLine, refold } from "./content-lines";

/** One session as a calendar shows it. */
export interface FeedEvent {
  /** Stable for the session's life (RFC 7986 5.3: random, no host data). */
  readonly uid: string;
  readonly source: "lift" | "sport" | "bout" | "weigh-in";
  readonly title: string;
  readonly description: string;
  readonly place: string;
  readonly startsAt: Date;
  readonly endsAt: Date;
  /** False for what takes up no time, such as a rest day. */
  readonly busy: boolean;
  readonly cancelled: boolean;
  /** RFC 5545 3.8.7.4. */
  readonly sequence: number;
  /** Time of the revision that last touched it. */
  readonly changedAt: Date;
}

export interface Feed {
  /** Name of the calendar. */
  readonly name: string;
  /** Titles without content, no place and no description. */
  readonly discreet: boolean;
  readonly events: readonly FeedEvent[];
  /** Time of the newest revision; null where there is none. */
  readonly refreshedAt: Date | null;
}

const CRLF = "\r\n";
const PRODUCT = "-//Bellward//Camp calendar//EN";
/** How often a client is asked to look: what the library writes as X-PUBLISHED-TTL, said again in RFC 7986's own words. */
const EVERY = "PT1H";

const DISCREET: Record<FeedEvent["source"], string> = {
  lift: "Training",
  sport: "Sport",
  bout: "Bout",
  "weigh-in": "Appointment",
};

// RFC 5545 wants at least one component; a camp without sessions has none to show.
const NOTHING = [
  "BEGIN:VTIMEZONE",
  "TZID:Etc/UTC",
  "BEGIN:STANDARD",
  "DTSTART:19700101T000000",
  "TZOFFSETFROM:+0000",
  "TZOFFSETTO:+0000",
  "END:STANDARD",
  "END:VTIMEZONE",
  "",
].join(CRLF);

type Timed = EventAttributes & { timestamp: number };

function attributesOf(event: FeedEvent, discreet: boolean): Timed {
  const description = discreet ? "" : cleanText(event.description);
  const place = discreet ? "" : cleanText(event.place);
  return {
    uid: event.uid,
    title: discreet ? DISCREET[event.source] : cleanText(event.title),
    ...(description !== "" && { description }),
    ...(place !== "" && { location: place }),
    start: event.startsAt.getTime(),
    startInputType: "utc",
    startOutputType: "utc",
    end: event.endsAt.getTime(),
    endInputType: "utc",
    endOutputType: "utc",
    sequence: event.sequence,
    status: event.cancelled ? "CANCELLED" : "CONFIRMED",
    transp: event.busy && !event.cancelled ? "OPAQUE" : "TRANSPARENT",
    // Without METHOD, DTSTAMP is the time of the last revision (RFC 5545 3.8.7.2), so that the same state is the same bytes.
    timestamp: event.changedAt.getTime(),
    lastModified: event.changedAt.getTime(),
  };
}

function written(events: Timed[], calName: string): string {
  // The default METHOD would make this an iTIP message, which needs an ORGANIZER (RFC 5546 3.2.1).
  const { error, value } = createEvents(events, { productId: PRODUCT, calName, method: undefined });
  if (error || value === null) throw new Error("The calendar could not be written.", { cause: error });
  return value;
}

/** The library checks each event against a schema, at a fifth of a millisecond: events that did not change are kept. */
const blocks = new Map<string, string>();
const MOST_BLOCKS = 20_000;

function blockOf(event: FeedEvent, discreet: boolean): string {
  const attributes = attributesOf(event, discreet);
  const key = JSON.stringify(attributes);
  const known = blocks.get(key);
  if (known !== undefined) return known;
  const text = written([attributes], "");
  const block = refold(text.slice(text.indexOf("BEGIN:VEVENT"), text.lastIndexOf("END:VCALENDAR")));
  const oldest = blocks.keys().next();
  if (blocks.size >= MOST_BLOCKS && !oldest.done) blocks.delete(oldest.value);
  blocks.set(key, block);
  return block;
}

/** `20261201T081500Z`. */
const utcText = (date: Date): string => `${date.toISOString().slice(0, 19).replace(/[-:]/g, "")}Z`;

/**
 * A calendar to subscribe to (RFC 5545, RFC 7986): instants in UTC, no METHOD, lines folded by octets. The same feed gives
 * the same bytes, at any time and in any time zone of the machine.
 */
export function buildFeed({ name, discreet, events, refreshedAt }: Feed): string {
  const calendarName = escapeText(name);
  // The library writes the name as it is given; what it cannot express follows its last header line.
  const header = refold(written([], calendarName)).replace(`END:VCALENDAR${CRLF}`, "");
  const more = [
    foldLine(`NAME:${calendarName}`),
    `REFRESH-INTERVAL;VALUE=DURATION:${EVERY}`,
    ...(refreshedAt ? [`LAST-MODIFIED:${utcText(refreshedAt)}`] : []),
  ];
  const body = events.length === 0 ? NOTHING : events.map((event) => blockOf(event, discreet)).join("");
  return `${header}${more.map((line) => line + CRLF).join("")}${body}END:VCALENDAR${CRLF}`;
}
