"use client";

import { hoursText } from "@/components/session/camp-days";
import { SPORT_LOOKS } from "@/components/session/kinds";
import { Button } from "@/components/ui/button";
import { findOccurrence } from "@/lib/book/sport-edits";
import type { SportSession } from "@/lib/engine/types";
import { dayText } from "@/lib/format/civil";
import { campSpan } from "@/lib/book/camp-span";
import { moveChange } from "../move-change";
import { isPastAt } from "../picture";
import type { Desk } from "../use-desk";
import { DetailHead, DetailPart, OpenSession } from "./detail-parts";
import { MoveForm } from "./move-form";
import { moveSpan } from "./move-span";
import { ruleText } from "./recurrence";

interface SportDetailsProps {
  readonly desk: Desk;
  readonly session: SportSession;
  readonly onEdit: () => void;
  readonly onClose: () => void;
}

const factsOf = ({ effort, minutes }: SportSession): string =>
  `effort ${effort} · ${Math.round(effort * minutes)} AU`;

/** One sport session: when, how hard, how often; and what a coach may do with it. */
export function SportDetails({ desk, session, onEdit, onClose }: SportDetailsProps) {
  const { shown, view, now, standing, state } = desk;
  const { from, to } = campSpan(shown.book);
  const entry = findOccurrence(shown.book, session.id, from, to)?.entry;
  const past = isPastAt(shown.zone, session, now);
  const write = view.may.includes("sport.write") && !past && shown.book.status === "on";
  const broken = shown.plan.violations.filter((violation) => violation.ids.includes(session.id));
  const saved = standing.sport.some((candidate) => candidate.id === session.id);
  return (
    <article aria-label={session.title}>
      <DetailHead
        look={SPORT_LOOKS[session.kind]}
        title={session.title}
        when={`${dayText(session.day)}, ${hoursText(session)}${entry?.place ? `, ${entry.place}` : ""}`}
        facts={view.may.includes("lifts.detail") ? factsOf(session) : ""}
        onClose={onClose}
      />
      <p className="px-4 pb-3 text-sm text-ink-2">
        {SPORT_LOOKS[session.kind].label}
        {entry?.rrule ? `, ${ruleText(entry.rrule)}` : ", once"}
      </p>
      {saved ? <OpenSession campId={view.id} id={session.id} /> : null}
      {past ? <p className="px-4 pb-3 text-sm">This is past, and what is past stays.</p> : null}
      {broken.length > 0 ? (
        <DetailPart title="Rules it has to do with">
          <ul className="grid gap-1 text-sm">
            {broken.map((violation) => (
              <li key={violation.rule + violation.text}>{violation.text}</li>
            ))}
          </ul>
        </DetailPart>
      ) : null}
      {write ? (
        <>
          <DetailPart title="Move it">
            <MoveForm
              at={session}
              {...moveSpan(desk)}
              onMove={(place) => {
                const change = moveChange(standing, state.pending?.change ?? null, session.id, place);
                if (change) desk.tryChange(change);
              }}
            />
          </DetailPart>
          {saved ? (
            <div className="flex gap-2 border-t border-line-soft px-4 py-3">
              <Button size="small" onClick={onEdit}>
                Edit
              </Button>
              <Button
                size="small"
                onClick={() => desk.tryChange({ kind: "sport.drop", sportId: session.id, scope: "this" })}
              >
                Take it out
              </Button>
            </div>
          ) : null}
        </>
      ) : null}
    </article>
  );
}
