"use client";

import { useState } from "react";
import { Button } from "@/components/ui/button";
import type { Line } from "@/lib/engine/prescription/types";
import type { MassUnit } from "@/lib/format/load";
import type { DaySession, LoggedSet, SessionLog } from "@/lib/schemas/today";
import { asWritten } from "./prescription-words";
import { restStore } from "./rest-store";
import { placeOfSet, SetList } from "./set-list";
import type { Acts } from "./use-acts";

interface LiftLogProps {
  readonly session: DaySession;
  readonly log: SessionLog;
  readonly unit: MassUnit;
  readonly acts: Acts;
}

interface Place {
  readonly line: Line;
  readonly number: number;
}

const placesOf = (lines: readonly Line[]): Place[] =>
  lines.flatMap((line) => Array.from({ length: line.sets }, (_, index) => ({ line, number: index + 1 })));

const keyOf = ({ line, number }: Place): string => placeOfSet({ slot: line.slot, number });

const without = (sets: readonly LoggedSet[], place: string): LoggedSet[] =>
  sets.filter((set) => placeOfSet(set) !== place);

/** A set makes a missed session a begun one; a finished one stays finished when it is put right. */
const begun = (state: SessionLog["state"]): SessionLog["state"] => (state === "missed" ? "open" : state);

/** Sets of a lift, one after the other; each is kept when it is ticked, and starts the rest before the next. */
export function LiftLog({ session, log, unit, acts }: LiftLogProps) {
  const lines = session.prescription?.lines ?? [];
  const places = placesOf(lines);
  const doneOf = (sets: readonly LoggedSet[]) => new Set(sets.map(placeOfSet));
  const done = doneOf(log.sets);
  const firstOpen = places.find((place) => !done.has(keyOf(place)));
  const [active, setActive] = useState<string | null>(firstOpen ? keyOf(firstOpen) : null);

  const put = (line: Line, set: LoggedSet, ticked: boolean): void => {
    const place = placeOfSet(set);
    acts.log(session, ({ sets, state }) => ({ state: begun(state), sets: [...without(sets, place), set] }));
    if (ticked) return;
    const next = places.find((candidate) => keyOf(candidate) !== place && !done.has(keyOf(candidate)));
    setActive(next ? keyOf(next) : null);
    if (next) restStore.start(line.rest, `${next.line.name}, set ${next.number}`);
    else restStore.stop();
  };
  const remove = (set: Pick<LoggedSet, "slot" | "number">): void => {
    const place = placeOfSet(set);
    acts.log(session, ({ sets }) => ({ sets: without(sets, place) }));
    setActive(place);
  };
  const allAsWritten = (): void => {
    acts.log(session, ({ sets, state }) => {
      const there = doneOf(sets);
      const rest = places.filter((place) => !there.has(keyOf(place)));
      return {
        state: begun(state),
        sets: [
          ...sets,
          ...rest.map(({ line, number }) => asWritten(line, number, session.lastTime[line.exercise])),
        ],
      };
    });
    setActive(null);
    restStore.stop();
  };
  if (places.length === 0) return null;
  return (
    <div className="mt-3">
      {firstOpen ? (
        <Button wide className="mb-3 min-h-12" onClick={allAsWritten}>
          {done.size === 0 ? "Everything as written" : "The rest as written"}
        </Button>
      ) : null}
      {lines.map((line) => (
        <SetList
          key={line.slot}
          line={line}
          unit={unit}
          last={session.lastTime[line.exercise]}
          sets={log.sets.filter(({ slot }) => slot === line.slot)}
          active={active}
          onActive={setActive}
          onPut={(set, ticked) => put(line, set, ticked)}
          onRemove={remove}
        />
      ))}
    </div>
  );
}
