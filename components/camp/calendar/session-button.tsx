"use client";

import { useSyncExternalStore } from "react";
import { SessionChip, type ChipState } from "@/components/session/chip";
import { entryTime } from "./entry";
import type { EntryStore } from "./entry-store";

interface SessionButtonProps {
  readonly store: EntryStore;
  readonly id: string;
  /** Drawn where a dragged session would land: looks only. */
  readonly mirror: boolean;
  readonly onOpen: (sessionId: string) => void;
}

/** A session in the calendar. The calendar's own keys (`use-calendar-keys`) make one of these buttons its tab stop. */
export function SessionButton({ store, id, mirror, onOpen }: SessionButtonProps) {
  const read = () => store.read(id);
  const entry = useSyncExternalStore(store.subscribe, read, read);
  if (!entry) return null;
  const chip = (state: ChipState) => (
    <SessionChip look={entry.look} title={entry.title} time={entryTime(entry)} {...state} />
  );
  if (mirror) return chip({ moved: true, held: true });
  if (entry.state.ghost) return chip(entry.state);
  return (
    <button
      type="button"
      tabIndex={-1}
      data-session={entry.sessionId}
      aria-label={entry.label}
      aria-pressed={entry.state.marked ?? false}
      onClick={() => onOpen(entry.sessionId)}
      className="block w-full rounded text-left"
    >
      {chip(entry.state)}
    </button>
  );
}
