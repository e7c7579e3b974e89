"use client";

import type { RefCallback } from "react";
import { Button } from "@/components/ui/button";
import { Notice } from "@/components/ui/notice";
import { isPreview } from "@/lib/book/preview-result";
import type { LiveChange, Pending } from "../desk-state";
import { subjectOf } from "../move-change";
import type { Desk } from "../use-desk";
import { respondText } from "../words";
import { changeHeading, saveText } from "./words";
import { EffectList } from "./effect-list";
import { MissedChanges } from "./missed-changes";
import { ScopeChoice } from "./scope-choice";

interface KnockOnRailProps {
  readonly desk: Desk;
  readonly pending: Pending;
  readonly heading: RefCallback<HTMLHeadingElement>;
}

/** True where the change is about one occurrence of a recurring session, so that it may be about more. */
function repeats(
  change: LiveChange,
  desk: Desk,
): change is Extract<LiveChange, { kind: "sport.edit" | "sport.drop" }> {
  if (change.kind !== "sport.edit" && change.kind !== "sport.drop") return false;
  return (
    desk.standing.book.sport.some(
      (entry) => entry.rrule !== null && change.sportId.startsWith(`${entry.series}@`),
    ) && !desk.standing.book.sport.some((entry) => entry.id === change.sportId)
  );
}

/** What a change does to the rest, before it is saved, and the one button that saves it. */
export function KnockOnRail({ desk, pending, heading }: KnockOnRailProps) {
  const { change } = pending;
  const { preview, state, standing } = desk;
  const held = preview && isPreview(preview) ? preview : null;
  const subject = subjectOf(change);
  return (
    <>
      <div className="px-4 pt-4 pb-3">
        <h2 ref={heading} tabIndex={-1} className="text-lg leading-tight font-semibold outline-none">
          {changeHeading(change, standing)}
        </h2>
        {held ? (
          <p className="mt-1 text-xs text-ink-2">Not saved yet. {respondText(held.knockOn, subject)}</p>
        ) : null}
      </div>
      {preview === null ? (
        <p role="status" className="px-4 pb-3 text-sm text-ink-2">
          Working out what it knocks on …
        </p>
      ) : null}
      <MissedChanges missed={state.missed} zone={desk.view.book.homeZone} />
      {state.refusal ? (
        <Notice role="alert" tone="error" title="Not saved" className="mx-4 mb-3">
          {state.refusal}
        </Notice>
      ) : null}
      {preview && !isPreview(preview) ? (
        <Notice role="alert" tone="error" title="That cannot be done" className="mx-4 mb-3">
          {preview.problems.map((problem) => (
            <p key={problem.pointer + problem.message}>{problem.message}</p>
          ))}
        </Notice>
      ) : null}
      {repeats(change, desk) ? (
        <div className="px-4 pb-3">
          <ScopeChoice value={change.scope} onChange={(scope) => desk.tryChange({ ...change, scope })} />
        </div>
      ) : null}
      {held ? <EffectList knockOn={held.knockOn} subject={subject} /> : null}
      <div className="sticky bottom-0 flex gap-2 border-t border-line bg-paper px-4 py-3">
        {held ? (
          <Button
            variant="primary"
            className="flex-1 whitespace-normal"
            onClick={desk.save}
            disabled={state.hand !== null}
          >
            {saveText(desk.people, change.kind === "bout.off" ? "Mark the bout off" : "Save")}
          </Button>
        ) : null}
        <Button onClick={() => desk.dispatch({ type: "clear" })}>
          {state.missed.length > 0 ? "Discard" : "Put it back"}
        </Button>
      </div>
    </>
  );
}
