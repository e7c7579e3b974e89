import type { BoardAttendance, BoardRow } from "@/lib/schemas/board";

const STATE_WORDS: Readonly<Record<BoardAttendance["state"], string>> = {
  done: "done",
  missed: "missed",
  "not-yet": "not yet",
  asked: "asks to be let off",
  excused: "let off",
};

const whole = new Intl.NumberFormat("en-GB", { maximumFractionDigits: 0 });

/** Who turned up today, and the load of the week. Nothing for those who may not read logs. */
export function TodayList({
  row: { attendance, load },
}: {
  readonly row: Pick<BoardRow, "attendance" | "load">;
}) {
  if (attendance === null) return null;
  return (
    <div className="text-sm">
      {attendance.length === 0 ? <p className="text-ink-2">Nothing today</p> : null}
      <ul aria-label="Today">
        {attendance.map(({ sessionId, title, start, state }) => (
          <li key={sessionId}>
            {start} {title}: <b className="font-semibold">{STATE_WORDS[state]}</b>
          </li>
        ))}
      </ul>
      {load && load.planned > 0 ? (
        <p className="text-ink-2">
          This week {whole.format(load.done)} of {whole.format(load.planned)} AU
        </p>
      ) : null}
    </div>
  );
}
