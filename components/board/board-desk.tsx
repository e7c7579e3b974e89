"use client";

import { useDeferredValue, useRef, type KeyboardEvent } from "react";
import { Button } from "@/components/ui/button";
import { EmptyState } from "@/components/ui/empty-state";
import { LinkButton } from "@/components/ui/link-button";
import { LiveRegion } from "@/components/ui/live-region";
import { Notice } from "@/components/ui/notice";
import { useBoard } from "@/lib/query/board";
import type { BoardView } from "@/lib/schemas/board";
import { AthleteRow } from "./athlete-row";
import { BoardFilterBar } from "./board-filter-bar";
import { NO_FILTERS, rowAfterKey, shownRows } from "./filters";
import { useBoardFilters } from "./use-board-filters";

const countText = (shown: number, all: number): string => {
  const athletes = all === 1 ? "1 athlete" : `${all} athletes`;
  return shown === all ? `${athletes} in camp` : `${shown} of ${athletes} in camp`;
};

function Together({ together }: Pick<BoardView, "together">) {
  if (together.length === 0) return null;
  return (
    <details className="mb-3 rounded-md border border-line bg-paper px-4 py-2.5 text-sm">
      <summary className="font-semibold">Together today</summary>
      <ul className="mt-1.5 grid gap-1">
        {together.map(({ title, start, names }) => (
          <li key={`${start} ${title}`}>
            <b className="font-semibold">
              {start} {title}
            </b>
            : {names.join(", ")}
          </li>
        ))}
      </ul>
    </details>
  );
}

interface BoardDeskProps {
  readonly initial: BoardView;
  /** Whether this reader may lay out a camp. */
  readonly creates: boolean;
}

/** The coaches' first page: everyone in camp, narrowed and ordered by the address bar, walked by arrow keys. */
export function BoardDesk({ initial, creates }: BoardDeskProps) {
  const { data, isError } = useBoard(initial);
  const { filters, setFilters } = useBoardFilters();
  const list = useRef<HTMLOListElement>(null);
  // Typing stays ahead of the rows.
  const rows = shownRows(data.rows, useDeferredValue(filters));
  const links = (): HTMLElement[] => [
    ...(list.current?.querySelectorAll<HTMLElement>("[data-board-row]") ?? []),
  ];
  const walk = (event: KeyboardEvent<HTMLOListElement>): void => {
    const all = links();
    // Arrows inside a field belong to the field.
    const at = all.findIndex((link) => link === event.target);
    const next = at < 0 ? null : rowAfterKey(event.key, at, all.length);
    if (next === null) return;
    event.preventDefault();
    all[next]?.focus();
  };
  if (data.rows.length === 0)
    return (
      <EmptyState
        title="Nobody is in camp"
        action={
          creates ? (
            <LinkButton href="/camps/new" variant="primary">
              Set a bout
            </LinkButton>
          ) : undefined
        }
      >
        Give a bout date and the camp is laid out around the sport’s own week. Camps that are over are under
        Camps.
      </EmptyState>
    );
  const count = countText(rows.length, data.rows.length);
  return (
    <>
      <BoardFilterBar filters={filters} onChange={setFilters} onDown={() => links()[0]?.focus()} />
      <p className="mt-3 mb-2 text-sm text-ink-2">{count}</p>
      <LiveRegion>{count}</LiveRegion>
      {isError ? (
        <Notice tone="error" role="status" title="This page may be behind" className="mb-3">
          The newest could not be fetched; what you see is from before.
        </Notice>
      ) : null}
      <Together together={data.together} />
      {rows.length > 0 ? (
        <ol ref={list} aria-label="Athletes in camp" className="grid gap-2" onKeyDown={walk}>
          {rows.map((row, index) => (
            <AthleteRow key={row.campId} row={row} index={index} />
          ))}
        </ol>
      ) : (
        <EmptyState
          title="Nobody is left"
          action={<Button onClick={() => setFilters(NO_FILTERS)}>Show everyone</Button>}
        >
          Take a filter off, or look for another name.
        </EmptyState>
      )}
    </>
  );
}
