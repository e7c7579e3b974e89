import { dayFromIso } from "@/lib/engine/geometry";
import { dayText } from "@/lib/format/civil";
import { loadText, restText, workText, type MassUnit } from "@/lib/format/load";
import type { LineView, SheetSession } from "@/lib/schemas/prescription";

const CELL = "border border-[#000] px-[0.4em] py-[0.3em] align-top";

/** One box a set, to write down what was done. */
const Boxes = ({ sets }: { readonly sets: number }) => (
  <span aria-hidden="true" className="flex flex-wrap gap-[0.25em]">
    {Array.from({ length: sets }, (_, index) => (
      <span key={index} className="inline-block h-[1.9em] w-[3em] border border-[#000]" />
    ))}
  </span>
);

function LineRow({ line, unit }: { readonly line: LineView; readonly unit: MassUnit }) {
  const load = loadText(line.load, unit);
  return (
    <tr className="break-inside-avoid">
      <th scope="row" className={`${CELL} text-left font-semibold [overflow-wrap:anywhere]`}>
        {line.name}
        {line.note ? <span className="block font-normal">Coach: {line.note}</span> : null}
      </th>
      <td className={CELL}>
        <b className="font-semibold">{workText(line)}</b>
        {load ? <span className="block">{load}</span> : null}
        <span className="block">rest {restText(line.rest)}</span>
      </td>
      <td className={CELL}>
        <Boxes sets={line.sets} />
      </td>
    </tr>
  );
}

interface SheetLiftProps {
  readonly session: SheetSession;
  readonly lift: NonNullable<SheetSession["lift"]>;
  readonly unit: MassUnit;
}

/** One lifting session, line by line, with room for a pencil. */
export function SheetLift({ session, lift, unit }: SheetLiftProps) {
  const title = `${dayText(dayFromIso(session.date))} ${session.start}, ${session.title}`;
  return (
    <section className="break-inside-avoid">
      <h2 className="font-semibold">
        {title}, {lift.sets} sets
      </h2>
      {lift.note ? <p>Coach: {lift.note}</p> : null}
      {lift.warmUp.length > 0 ? <p>Warm-up: {lift.warmUp.join(", ")}</p> : null}
      <table className="mt-[0.3em] w-full table-fixed border-collapse">
        <caption className="sr-only">{title}</caption>
        <thead>
          <tr>
            <th scope="col" className={`${CELL} w-[33%] text-left font-semibold`}>
              Exercise
            </th>
            <th scope="col" className={`${CELL} w-[31%] text-left font-semibold`}>
              Asked
            </th>
            <th scope="col" className={`${CELL} text-left font-semibold`}>
              Done
            </th>
          </tr>
        </thead>
        <tbody>
          {lift.lines.map((line) => (
            <LineRow key={line.slot} line={line} unit={unit} />
          ))}
        </tbody>
      </table>
      {lift.empty.map(({ slot, purpose, why }) => (
        <p key={slot}>
          Nothing for {purpose}: {why}
        </p>
      ))}
    </section>
  );
}
