"use client";

import dynamic from "next/dynamic";
import { useCallback, useEffect, useState } from "react";
import { Waiting } from "@/components/suggestions/waiting";
import { Notice } from "@/components/ui/notice";
import { isoFromDay } from "@/lib/engine/geometry";
import type { Day, Instant } from "@/lib/engine/types";
import { useCamp } from "@/lib/query/camps";
import { useCampLive } from "@/lib/query/use-camp-live";
import type { CampView } from "@/lib/schemas/camp";
import { CalendarArea } from "./calendar/calendar-area";
import { CampHead } from "./camp-head";
import { createDayMark } from "./day-mark";
import { HoldNotice } from "./hold-notice";
import { Rail } from "./rail/rail";
import { Ropes } from "./ropes/ropes";
import { todayOf } from "./today";
import { useDesk } from "./use-desk";
import { useHeadingFocus } from "./rail/use-heading-focus";
import { useNow } from "./use-now";
import { WeekTable } from "./week-table";

// Forms and their validator are fetched when they are opened: most visits only look.
const BoutDialog = dynamic(() => import("./dialogs/bout-dialog").then((module) => module.BoutDialog), {
  ssr: false,
});
const SportDialog = dynamic(() => import("./dialogs/sport-dialog").then((module) => module.SportDialog), {
  ssr: false,
});

interface CampPageProps {
  readonly initial: CampView;
  readonly now: Instant;
  /** Session whose details are open at first. */
  readonly selected: string | null;
}

type OpenDialog =
  | { readonly kind: "bout" }
  | { readonly kind: "add"; readonly date: string }
  | { readonly kind: "edit"; readonly id: string };

/** One camp: count, ropes, calendar, knock-on rail. */
export function CampPage({ initial, now: serverNow, selected }: CampPageProps) {
  const told = useCampLive(initial.id);
  const { data: view, isError, error } = useCamp(initial, told);
  const now = useNow(serverNow);
  const desk = useDesk(view, now, selected);
  const [mark] = useState(createDayMark);
  const [dialog, setDialog] = useState<OpenDialog | null>(null);
  const heading = useHeadingFocus();

  const { shown, dispatch } = desk;
  useEffect(() => {
    // Mails lead to a session by the part of the address that the server never sees.
    const id = decodeURIComponent(window.location.hash.replace(/^#session-/, ""));
    if (window.location.hash.startsWith("#session-")) dispatch({ type: "select", id });
  }, [dispatch]);
  const today = todayOf(shown.book, now);
  const openSession = useCallback((id: string) => dispatch({ type: "select", id }), [dispatch]);
  const addOn = useCallback((day: Day) => setDialog({ kind: "add", date: isoFromDay(day) }), []);
  const close = (): void => setDialog(null);
  const active = desk.state.pending !== null || desk.state.selected !== null;

  return (
    <div className={active ? "max-lg:pb-[58dvh]" : undefined}>
      <CampHead
        view={view}
        book={shown.book}
        today={today}
        onBout={() => setDialog({ kind: "bout" })}
        onAdd={() => addOn(today)}
      />
      {view.may.includes("suggestions.decide") ? <Waiting desk={desk} /> : null}
      <HoldNotice book={shown.book} today={today} />
      <Ropes picture={shown} today={today} weights={view.weights} may={view.may} mark={mark} />
      <div className="mt-4 grid items-start gap-4 lg:grid-cols-[minmax(0,1fr)_356px]">
        <CalendarArea
          desk={desk}
          today={today}
          mark={mark}
          onOpen={openSession}
          onAdd={addOn}
          onDropped={heading.wanted}
        />
        <Rail desk={desk} heading={heading.ref} onEdit={(id) => setDialog({ kind: "edit", id })} />
      </div>
      {view.may.includes("lifts.detail") ? <WeekTable plan={shown.plan} /> : null}
      {isError ? (
        // Over the page, not in it: what is being dragged must not move under the pointer.
        <div className="fixed bottom-3 left-3 z-40 max-w-sm">
          <Notice tone="error" role="status" title="This page may be behind">
            {error.message}
          </Notice>
        </div>
      ) : null}
      {dialog?.kind === "bout" ? <BoutDialog desk={desk} onClose={close} /> : null}
      {dialog?.kind === "add" || dialog?.kind === "edit" ? (
        <SportDialog desk={desk} target={dialog} onClose={close} />
      ) : null}
    </div>
  );
}
