"use client";

import { useLayoutEffect, useRef } from "react";
import { PHASE_LOOKS, weekTitle } from "@/components/session/kinds";
import { dayFromIso } from "@/lib/engine/geometry";
import { dayText, longDayText } from "@/lib/format/civil";
import type { SheetView } from "@/lib/schemas/prescription";
import { LARGEST, fittingSize } from "./fit";
import { SheetDays } from "./sheet-days";
import { SheetLift } from "./sheet-lift";

/**
 * Paper, and nothing of the screen: no ground, no least height that would fill a second page. Here and not in the style sheet
 * of all pages, which print on whatever their reader likes.
 */
const PRINT = `
@page { size: A4 portrait; margin: 10mm; }
@media print {
  html { background: #fff; color: #000; color-scheme: light; }
  body { min-height: 0; background: #fff; }
}`;

function daysOutLine({ week }: SheetView): string {
  const last = week.daysOut - (dayFromIso(week.to) - dayFromIso(week.from));
  return last === 0 ? `${week.daysOut} days out to the bout` : `${week.daysOut} to ${last} days out`;
}

/** Sets the type as large as one page allows, once the fonts are there. */
function useFit(view: SheetView) {
  const paper = useRef<HTMLElement>(null);
  useLayoutEffect(() => {
    const fit = (): void => {
      const element = paper.current;
      if (!element) return;
      const size = fittingSize((tried) => {
        element.style.fontSize = `${tried}pt`;
        return element.scrollHeight <= element.clientHeight;
      });
      element.style.fontSize = `${size}pt`;
    };
    fit();
    let gone = false;
    void document.fonts.ready.then(() => {
      if (gone) return;
      fit();
      if (paper.current) paper.current.dataset.fitted = "";
    });
    return () => {
      gone = true;
    };
  }, [view]);
  return paper;
}

/** A camp week on one page of A4, black on white whatever the screen. */
export function Paper({ view }: { readonly view: SheetView }) {
  const paper = useFit(view);
  const { athlete, bout, week, days, unit } = view;
  const lifts = days.flatMap(({ sessions }) =>
    sessions.flatMap((session) => (session.lift ? [{ session, lift: session.lift }] : [])),
  );
  const phase = PHASE_LOOKS[week.phase].label;
  return (
    // On a phone the page is wider than the window: it scrolls, also by keyboard.
    <div
      role="region"
      aria-label="The page as it is printed"
      tabIndex={0}
      className="overflow-x-auto bg-[#fff] p-[10mm] print:overflow-visible print:p-0"
    >
      <style>{PRINT}</style>
      {/* 5 mm less than the page: a rounded pixel must not open a second one. */}
      <article
        ref={paper}
        aria-label={`Sheet of ${athlete.name}`}
        style={{ fontSize: `${LARGEST}pt` }}
        className="max-print:box-content max-print:p-[10mm] mx-auto flex h-[272mm] w-[190mm] flex-col gap-[1em] overflow-hidden bg-[#fff] px-[0.5mm] leading-[1.25] text-[#000] [color-scheme:light]"
      >
        <header className="flex items-end justify-between gap-[2em] border-b-2 border-[#000] pb-[0.6em]">
          <div className="min-w-0">
            <h2 className="text-[1.9em] leading-[1.1] font-semibold [overflow-wrap:anywhere]">
              {athlete.name}
            </h2>
            <p>
              {dayText(dayFromIso(week.from))} to {dayText(dayFromIso(week.to))}, {phase}
              {week.deload ? ", light week" : ""}, {daysOutLine(view)}
            </p>
            <p className="[overflow-wrap:anywhere]">
              {view.off ? "The bout is off. Was: " : "Bout: "}
              {longDayText(dayFromIso(bout.date))}, {bout.time}
              {bout.opponent ? `, v ${bout.opponent}` : ""}
              {bout.place ? `, ${bout.place}` : ""}
            </p>
          </div>
          <p className="font-display text-[3.6em] leading-[0.85] whitespace-nowrap uppercase">
            {weekTitle(week.weeksOut)}
          </p>
        </header>
        <SheetDays days={days} />
        <div className="grid grid-cols-2 content-start items-start gap-[1em]">
          {lifts.map(({ session, lift }) => (
            <SheetLift key={session.id} session={session} lift={lift} unit={unit} />
          ))}
        </div>
        <footer className="mt-auto border-t border-[#000] pt-[0.4em] text-[0.85em]">
          Loads come from an estimate; a qualified coach watches heavy and ballistic lifts. After a knock to
          the head contact stops until a medic says otherwise; nothing here is a medical clearance. Rapid
          weight loss can injure or kill: work with a licensed physician and a registered dietitian, and
          follow your commission’s rules.
        </footer>
      </article>
    </div>
  );
}
