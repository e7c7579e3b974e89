"use client";

import { useEffect, useMemo, useState } from "react";
import type { Desk } from "../use-desk";
import { calendarEntries, type CalendarEntry } from "./entry";
import { createEntryStore, type EntryStore } from "./entry-store";

/** The chips to draw now, and the store that the chips read themselves from. */
export function useEntries(desk: Desk): { entries: readonly CalendarEntry[]; store: EntryStore } {
  const { shown, preview, now, view, state } = desk;
  const entries = useMemo(
    () => calendarEntries({ shown, preview, now, may: view.may, hand: state.hand, selected: state.selected }),
    [shown, preview, now, view.may, state.hand, state.selected],
  );
  const [store] = useState(() => createEntryStore(entries));
  useEffect(() => store.write(entries), [store, entries]);
  return { entries, store };
}
