import { KindMark } from "@/components/session/kind-mark";
import { SPORT_LOOKS, WEIGH_IN_LOOK, liftLook, type WorkLook } from "@/components/session/kinds";
import { classNames } from "@/components/ui/class-names";
import { dayFromIso } from "@/lib/engine/geometry";
import { ITEMS, SPORT_KINDS, type Phase } from "@/lib/engine/types";
import { dayText } from "@/lib/format/civil";
import type { BoardDay, BoardMark, BoardRow } from "@/lib/schemas/board";

function lookOf({ kind, source }: BoardMark, phase: Phase | null): WorkLook | null {
  const item = ITEMS.find((known) => known === kind);
  if (item) return liftLook(item, phase ?? "strength");
  const sport = SPORT_KINDS.find((known) => known === kind);
  if (sport) return SPORT_LOOKS[sport];
  return source === "weigh-in" ? WEIGH_IN_LOOK : null;
}

/** A tick under what was done, a cross under what was missed: the word beside it is for readers. */
function StateMark({ state }: { readonly state: "done" | "missed" }) {
  return (
    <>
      <svg
        width="9"
        height="9"
        viewBox="0 0 10 10"
        fill="none"
        stroke="currentColor"
        strokeWidth="1.6"
        aria-hidden="true"
      >
        <path d={state === "done" ? "M1 5.5L4 8.5L9 1.5" : "M2 2L8 8M8 2L2 8"} />
      </svg>
      <span className="sr-only">{state}</span>
    </>
  );
}

function Mark({ mark, phase }: { readonly mark: BoardMark; readonly phase: Phase | null }) {
  const look = lookOf(mark, phase);
  if (!look) return null;
  return (
    <span
      title={`${mark.title}, ${mark.start}${mark.state ? `, ${mark.state}` : ""}`}
      className="flex flex-col items-center gap-0.5"
    >
      <KindMark mark={look.mark} size={11} className={look.text} />
      <span className="sr-only">
        {mark.title} {mark.start}{" "}
      </span>
      {mark.state ? <StateMark state={mark.state} /> : null}
    </span>
  );
}

function DayCell({
  day,
  today,
  phase,
}: {
  readonly day: BoardDay;
  readonly today: string;
  readonly phase: Phase | null;
}) {
  const date = dayText(dayFromIso(day.date));
  const bout = day.marks.some(({ source }) => source === "bout");
  const past = day.date < today;
  return (
    <li
      aria-current={day.date === today ? "date" : undefined}
      className={classNames(
        "min-w-0 border-l border-line-soft last:border-r",
        day.date === today && "border-x border-x-ink",
      )}
    >
      <span
        className={classNames(
          "block text-center text-2xs",
          day.date === today ? "font-semibold" : "text-ink-2",
        )}
      >
        <span aria-hidden="true">{date.split(" ")[1]}</span>
        <span className="sr-only">{date}</span>
      </span>
      {bout ? (
        <span className="flex min-h-9 items-center justify-center bg-bar font-display text-bar-text">
          BOUT
        </span>
      ) : (
        <span
          className={classNames(
            "flex min-h-9 flex-wrap justify-center gap-1",
            past ? "content-start items-start" : "content-center items-center",
          )}
        >
          {day.marks.map((mark) => (
            <Mark key={mark.id} mark={mark} phase={phase} />
          ))}
        </span>
      )}
    </li>
  );
}

/** Three days back with what was done, today, and ten days ahead. */
export function DayStrip({ row }: { readonly row: Pick<BoardRow, "days" | "today" | "phase"> }) {
  return (
    <ol aria-label="Three days back to ten ahead" className="grid grid-cols-7 gap-y-1 sm:grid-cols-14">
      {row.days.map((day) => (
        <DayCell key={day.date} day={day} today={row.today} phase={row.phase} />
      ))}
    </ol>
  );
}
