"use client";

import { Button } from "@/components/ui/button";
import type { Entry } from "@/lib/offline/entry";
import type { Queue } from "@/lib/offline/queue";
import type { MassUnit } from "@/lib/format/load";
import type { SessionLog } from "@/lib/schemas/today";
import { logFacts } from "./log-summary";
import type { Acts } from "./use-acts";

interface StuckProps {
  readonly queue: Queue;
  readonly unit: MassUnit;
  readonly acts: Acts;
}

function Version({ title, log, unit }: { title: string; log: SessionLog; unit: MassUnit }) {
  return (
    <div className="min-w-0">
      <h3 className="text-xs font-semibold">{title}</h3>
      <ul>
        {logFacts(log, unit).map((fact) => (
          <li key={fact} className="break-words">
            {fact}
          </li>
        ))}
      </ul>
    </div>
  );
}

function Stuck({ entry, unit, acts }: { entry: Entry; unit: MassUnit; acts: Acts }) {
  const { key, title, work, stuck } = entry;
  if (!stuck) return null;
  const stale = stuck.why === "stale" && work.kind === "log";
  return (
    <section
      role="alert"
      aria-label={stale ? `Changed on another device: ${title}` : `Not taken: ${title}`}
      className="border-b border-l-4 border-line border-l-brass bg-brass-tint px-4 py-3 text-sm text-brass-text"
    >
      <h2 className="font-semibold">
        {stale ? "Changed on another device" : "Not taken"}: {title}
      </h2>
      {stale ? (
        <div className="mt-1.5 grid grid-cols-2 gap-3">
          <Version title="On this phone" log={work.log} unit={unit} />
          <Version title="On the other device" log={stuck.theirs} unit={unit} />
        </div>
      ) : null}
      {stuck.why === "refused" ? (
        <>
          <p className="mt-1">{stuck.text}</p>
          <ul className="list-disc pl-5">
            {stuck.errors.map(({ pointer, message }) => (
              <li key={pointer}>{message}</li>
            ))}
          </ul>
        </>
      ) : null}
      <div className="mt-2.5 grid grid-cols-2 gap-2">
        <Button
          className="min-h-12 border-brass-text! text-brass-text!"
          onClick={() => (stale ? acts.keepMine(key) : acts.again(key))}
        >
          {stale ? "Keep mine" : "Send again"}
        </Button>
        <Button className="min-h-12 border-brass-text! text-brass-text!" onClick={() => acts.drop(key)}>
          {stale ? "Take theirs" : "Throw away"}
        </Button>
      </div>
    </section>
  );
}

/** Writes that need a person: changed elsewhere, or refused. Nothing is lost until a button says so. */
export const StuckPanel = ({ queue, unit, acts }: StuckProps) =>
  queue
    .filter(({ stuck }) => stuck !== null)
    .map((entry) => <Stuck key={entry.key} entry={entry} unit={unit} acts={acts} />);
