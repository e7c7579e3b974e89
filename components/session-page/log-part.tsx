import { effortText } from "@/components/today/effort-words";
import { Panel } from "@/components/ui/panel";
import { Cell, HeadCell, Table } from "@/components/ui/table";
import { loadText, workText, type MassUnit } from "@/lib/format/load";
import type { LiftView, LineView } from "@/lib/schemas/prescription";
import type { LogView } from "@/lib/schemas/today";
import { setText } from "./words";

const STATES = { open: "Begun, not finished", done: "Done", missed: "Missed" } as const;

function factsOf(log: LogView): string[] {
  return [
    STATES[log.state],
    ...(log.effort === null ? [] : [`effort ${effortText(log.effort)}`]),
    ...(log.minutes === null ? [] : [`${log.minutes} min`]),
    ...(log.effort === null || log.minutes === null ? [] : [`${Math.round(log.effort * log.minutes)} AU`]),
    ...(log.hardRounds === null ? [] : [`${log.hardRounds} hard rounds`]),
  ];
}

/** Sets that were done in other places than the ones that are asked. */
function beside(lift: LiftView, log: LogView): string[] {
  const slots = new Set([...lift.warmUp, ...lift.lines].map(({ slot }) => slot));
  return [...new Set(log.sets.map(({ slot }) => slot))].filter((slot) => !slots.has(slot));
}

function SetTable({ lift, log, unit }: { lift: LiftView; log: LogView; unit: MassUnit }) {
  const doneIn = (slot: string) => log.sets.filter((set) => set.slot === slot);
  const done = (slot: string, line: LineView | null) =>
    doneIn(slot).map((set) => {
      const other = line === null || set.exerciseId !== line.exercise;
      const name = other ? `${lift.names[set.exerciseId] ?? set.exerciseId}: ` : "";
      return (
        <li key={set.number}>
          {name}
          {setText(set, line?.aim === "hold", unit)}
        </li>
      );
    });
  return (
    <Table caption="Planned and done" className="mt-3">
      <thead>
        <tr>
          <HeadCell>Exercise</HeadCell>
          <HeadCell>Planned</HeadCell>
          <HeadCell>Done</HeadCell>
        </tr>
      </thead>
      <tbody>
        {lift.lines.map((line) => {
          const sets = done(line.slot, line);
          return (
            <tr key={line.slot}>
              <HeadCell scope="row">{line.name}</HeadCell>
              <Cell>{[workText(line), loadText(line.load, unit)].filter(Boolean).join(" · ")}</Cell>
              <Cell>{sets.length > 0 ? <ol>{sets}</ol> : "No set logged"}</Cell>
            </tr>
          );
        })}
        {beside(lift, log).map((slot) => (
          <tr key={slot}>
            <HeadCell scope="row">Beside the plan</HeadCell>
            <Cell>Not planned</Cell>
            <Cell>
              <ol>{done(slot, null)}</ol>
            </Cell>
          </tr>
        ))}
      </tbody>
    </Table>
  );
}

interface LogPartProps {
  readonly log: LogView;
  readonly lift: LiftView | null;
  readonly unit: MassUnit;
}

/** What was logged, beside what was planned. */
export function LogPart({ log, lift, unit }: LogPartProps) {
  return (
    <Panel title="What was logged">
      <p>{factsOf(log).join(" · ")}</p>
      {log.knock ? (
        <p className="mt-1 font-semibold">
          Took a knock to the head. Contact stops until the medic says otherwise; this is no medical
          clearance.
        </p>
      ) : null}
      {log.pain !== null && log.pain > 0 ? (
        <p className="mt-1">
          Pain {log.pain} of 10{log.painPlace ? `, ${log.painPlace}` : ""}
        </p>
      ) : null}
      {log.note ? <p className="mt-1">In the athlete’s words: {log.note}</p> : null}
      {lift ? <SetTable lift={lift} log={log} unit={unit} /> : null}
    </Panel>
  );
}
