import { spawnSync } from "node:child_process";
import path from "node:path";
import ICAL from "ical.js";

/** A calendar as a program that is not ours understands it. */
export interface ReadCalendar {
  /** Null where the reader does not know the property. */
  readonly name: string | null;
  readonly properties: readonly string[];
  readonly components: readonly string[];
  readonly events: readonly ReadEvent[];
}

export interface ReadEvent {
  readonly uid: string;
  readonly title: string;
  readonly description: string;
  readonly place: string;
  readonly start: string;
  readonly end: string;
  readonly stamp: string;
  readonly sequence: number;
  readonly status: string;
  readonly transp: string;
  readonly properties: readonly string[];
}

const textOf = (component: ICAL.Component, name: string): string =>
  String(component.getFirstPropertyValue(name) ?? "");

function instantOf(component: ICAL.Component, name: string): string {
  const value = component.getFirstPropertyValue(name);
  if (!(value instanceof ICAL.Time)) throw new Error(`${name} is no time.`);
  return value.toJSDate().toISOString().replace(".000Z", "Z");
}

const namesOf = (component: ICAL.Component): string[] =>
  component
    .getAllProperties()
    .map((property) => property.name.toUpperCase())
    .toSorted();

/** Source of the reading: ical.js, the iCalendar parser of Mozilla's calendar. */
export function readWithIcalJs(text: string): ReadCalendar {
  const calendar = new ICAL.Component(ICAL.parse(text));
  return {
    // It does not know RFC 7986, so that NAME has no type for it.
    name: null,
    properties: namesOf(calendar),
    components: calendar.getAllSubcomponents().map((component) => component.name.toUpperCase()),
    events: calendar.getAllSubcomponents("vevent").map((event) => ({
      uid: textOf(event, "uid"),
      title: textOf(event, "summary"),
      description: textOf(event, "description"),
      place: textOf(event, "location"),
      start: instantOf(event, "dtstart"),
      end: instantOf(event, "dtend"),
      stamp: instantOf(event, "dtstamp"),
      sequence: Number(textOf(event, "sequence")),
      status: textOf(event, "status"),
      transp: textOf(event, "transp"),
      properties: namesOf(event),
    })),
  };
}

/** Source of the reading: Debian's python3-icalendar. */
export function readWithPython(text: string): ReadCalendar {
  const script = path.join(import.meta.dirname, "read-calendar.py");
  const { status, stdout, stderr } = spawnSync("/usr/bin/python3", [script], {
    input: text,
    encoding: "utf8",
    maxBuffer: 64 << 20,
  });
  if (status !== 0) throw new Error(`python3-icalendar cannot read it: ${stderr}`);
  const read = JSON.parse(stdout) as ReadCalendar & { errors: string[] };
  if (read.errors.length > 0) throw new Error(`python3-icalendar found: ${read.errors.join("; ")}`);
  return read;
}
