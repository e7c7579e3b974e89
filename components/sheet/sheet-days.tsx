import { hoursText } from "@/components/session/camp-days";
import { KindMark } from "@/components/session/kind-mark";
import { lookOf } from "@/components/today/looks";
import { dayFromIso, minuteFromHhmm } from "@/lib/engine/geometry";
import type { Item } from "@/lib/engine/types";
import { dayText } from "@/lib/format/civil";
import type { SheetSession, SheetView } from "@/lib/schemas/prescription";

const markOf = ({ source, kind }: SheetSession) =>
  lookOf({ source, kind, item: source === "lift" ? (kind as Item) : null })?.mark ?? "two-dots";

/** The seven days side by side, with everything on them. */
export function SheetDays({ days }: Pick<SheetView, "days">) {
  return (
    <table className="w-full table-fixed border-collapse border border-[#000]">
      <caption className="sr-only">The week day by day</caption>
      <thead>
        <tr>
          {days.map(({ date }) => (
            <th key={date} scope="col" className="border border-[#000] p-[0.4em] text-left font-semibold">
              {dayText(dayFromIso(date))}
            </th>
          ))}
        </tr>
      </thead>
      <tbody>
        <tr>
          {days.map(({ date, sessions }) => (
            <td key={date} className="border border-[#000] p-[0.4em] align-top">
              {sessions.length === 0 ? "Nothing planned" : null}
              <ul className="grid gap-[0.4em]">
                {sessions.map((session) => (
                  <li key={session.id} className="leading-[1.2] [overflow-wrap:anywhere]">
                    <span className="flex items-baseline gap-[0.4em]">
                      <KindMark mark={markOf(session)} size={7} />
                      <b className="min-w-0 font-semibold">{session.title}</b>
                    </span>
                    {hoursText({ start: minuteFromHhmm(session.start), minutes: session.minutes })}
                    {session.place ? `, ${session.place}` : ""}
                  </li>
                ))}
              </ul>
            </td>
          ))}
        </tr>
      </tbody>
    </table>
  );
}
