import { classNames } from "@/components/ui/class-names";
import { hhmm, isoFromDay } from "@/lib/engine/geometry";
import type { Day, Plan } from "@/lib/engine/types";
import { dayText } from "@/lib/format/civil";
import { hoursText, type CellEntry, type WeekRow } from "./camp-days";
import { SessionChip } from "./chip";
import { weekLook, weekTitle } from "./kinds";

interface CampWeekProps {
  readonly row: WeekRow;
  readonly bout: Plan["bout"];
  readonly today: Day;
  /** Id of the session whose reasons are shown. */
  readonly open: string | null;
  readonly whyId: string;
  readonly onOpen: (id: string) => void;
}

const month = new Intl.DateTimeFormat("en-GB", { month: "short", timeZone: "UTC" });

/** "15", and "Dec 1" where a month begins. */
function dayNumber(day: Day): string {
  const iso = isoFromDay(day);
  const number = Number(iso.slice(8));
  return number === 1 ? `${month.format(new Date(`${iso}T00:00:00Z`))} 1` : String(number);
}

function entryText(entry: CellEntry): string {
  const dose = entry.lift ? `, ${entry.lift.sets} sets` : "";
  return `${entry.title}, ${dayText(entry.day)}, ${hoursText(entry)}${dose}`;
}

function Gutter({ row }: Pick<CampWeekProps, "row">) {
  const { week } = row;
  const look = weekLook(week.phase, week.weeksOut, week.deload);
  return (
    <div
      role="rowheader"
      className="relative flex flex-wrap items-baseline gap-x-3 py-1.5 pr-2 pl-4 max-sm:col-span-7 max-sm:bg-line-soft sm:block sm:py-2"
    >
      <span className={classNames("absolute inset-y-0 left-0 w-1.5", look.bar)} />
      <span className="block font-display text-week max-sm:text-xl">{weekTitle(week.weeksOut)}</span>
      <span className="block text-xs text-ink-2">{look.label}</span>
      <span className="block text-xs font-semibold max-sm:ml-auto">
        {week.sets} {week.sets === 1 ? "set" : "sets"}
      </span>
    </div>
  );
}

function BoutCell({ bout }: Pick<CampWeekProps, "bout">) {
  return (
    <div className="flex flex-1 flex-col justify-between gap-1 p-1.5 text-ink-on sm:p-2">
      <span className="text-2xs sm:text-xs">{dayText(bout.day)}</span>
      <span className="block font-display text-bout max-sm:text-week">
        BOUT
        <span className="block text-[0.6em]">{hhmm(bout.start)}</span>
      </span>
    </div>
  );
}

const PAST = "bg-[repeating-linear-gradient(135deg,transparent_0_6px,var(--line-soft)_6px_7px)]";

type DayCellProps = Omit<CampWeekProps, "row"> & WeekRow["days"][number];

function DayCell({ day, entries, bout, today, open, whyId, onOpen }: DayCellProps) {
  const isBout = day === bout.day;
  return (
    <div
      role="cell"
      className={classNames(
        "min-w-0 border-line-soft max-sm:min-h-14 max-sm:not-nth-[2]:border-l sm:border-l",
        isBout ? "flex flex-col bg-ink" : "px-0.5 pt-1 pb-1.5 sm:px-1.5",
        day < today && PAST,
      )}
    >
      {isBout ? (
        <BoutCell bout={bout} />
      ) : (
        <span
          className={classNames(
            "block px-0.5 text-2xs",
            day === today ? "font-semibold text-ink" : "text-ink-3",
          )}
        >
          {dayNumber(day)}
          {day === today ? <span className="max-sm:sr-only"> today</span> : null}
        </span>
      )}
      {entries.map((entry) => (
        <button
          key={entry.id}
          type="button"
          aria-label={entryText(entry)}
          aria-expanded={open === entry.id}
          aria-controls={open === entry.id ? whyId : undefined}
          onClick={() => onOpen(entry.id)}
          className={classNames(
            "mt-1 block rounded",
            isBout ? "mx-1 mb-1.5 focus-visible:outline-paper" : "w-full",
          )}
        >
          <SessionChip
            look={entry.look}
            title={entry.title}
            past={day < today}
            marked={open === entry.id}
            markOnPhone
          />
        </button>
      ))}
    </div>
  );
}

/** One camp week of `CampGrid`: its gutter and its seven days. */
export function CampWeek({ row, ...rest }: CampWeekProps) {
  return (
    <div
      role="row"
      className="grid grid-cols-7 border-t border-line sm:min-h-[76px] sm:grid-cols-[118px_repeat(7,minmax(0,1fr))]"
    >
      <Gutter row={row} />
      {row.days.map((cell) => (
        <DayCell key={cell.day} {...cell} {...rest} />
      ))}
    </div>
  );
}
