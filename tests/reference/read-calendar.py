"""Reads a calendar from standard input with python3-icalendar and writes what it understood as JSON."""
import json
import sys
from datetime import timezone

from icalendar import Calendar

calendar = Calendar.from_ical(sys.stdin.buffer.read())


def instant(event, name):
    value = event.decoded(name)
    return value.astimezone(timezone.utc).strftime("%Y-%m-%dT%H:%M:%SZ")


def text(component, name):
    value = component.get(name)
    return None if value is None else str(value)


events = [
    {
        "uid": text(event, "UID"),
        "title": text(event, "SUMMARY"),
        "description": text(event, "DESCRIPTION") or "",
        "place": text(event, "LOCATION") or "",
        "start": instant(event, "DTSTART"),
        "end": instant(event, "DTEND"),
        "stamp": instant(event, "DTSTAMP"),
        "sequence": int(event.get("SEQUENCE")),
        "status": text(event, "STATUS"),
        "transp": text(event, "TRANSP"),
        "properties": sorted(event.keys()),
    }
    for event in calendar.walk("VEVENT")
]
json.dump(
    {
        "name": text(calendar, "NAME"),
        "properties": sorted(calendar.keys()),
        "components": [component.name for component in calendar.subcomponents],
        "events": events,
        "errors": [str(error) for event in calendar.walk("VEVENT") for error in event.errors],
    },
    sys.stdout,
)
