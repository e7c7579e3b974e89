"use client";

import dynamic from "next/dynamic";
import type { ReactNode, RefCallback } from "react";
import { classNames } from "@/components/ui/class-names";
import { KindLegend, legendOf } from "@/components/session/kind-legend";
import type { Desk } from "../use-desk";
import { CampRemarks } from "./camp-remarks";

// Fetched when a session is opened or a change is tried.
const KnockOnRail = dynamic(() => import("./knock-on-rail").then((module) => module.KnockOnRail), {
  ssr: false,
});
const SessionDetails = dynamic(
  () => import("../details/session-details").then((module) => module.SessionDetails),
  { ssr: false },
);

interface RailProps {
  readonly desk: Desk;
  readonly heading: RefCallback<HTMLHeadingElement>;
  readonly onEdit: (sportId: string) => void;
}

const Box = ({ children, label }: { readonly children: ReactNode; readonly label: string }) => (
  <section aria-label={label} className="border-line bg-paper max-lg:border-t lg:rounded-md lg:border">
    {children}
  </section>
);

function Idle({ desk }: Pick<RailProps, "desk">) {
  const { shown, view } = desk;
  return (
    <div className="grid gap-4 rounded-md border border-line bg-paper px-4 py-3.5">
      {view.may.includes("lifts.detail") ? (
        <CampRemarks
          plan={shown.plan}
          sport={shown.sport}
          onOpen={(id) => desk.dispatch({ type: "select", id })}
        />
      ) : null}
      <KindLegend entries={legendOf(shown.plan, shown.sport)} />
    </div>
  );
}

/**
 * Right of the calendar: what a change knocks on, the details of the open session, and what does not fit. On a narrow screen
 * the first two are a sheet at the bottom, out of the way while a finger carries a session.
 */
export function Rail({ desk, heading, onEdit }: RailProps) {
  const { pending, selected, saving, hand } = desk.state;
  const active = pending !== null || selected !== null;
  const carried = hand?.by === "pointer";
  return (
    <aside
      aria-label="Knock-on and details"
      className="grid content-start gap-4 lg:sticky lg:top-3 lg:max-h-[calc(100dvh-24px)] lg:overflow-y-auto"
    >
      {active ? (
        <div
          className={classNames(
            "max-lg:fixed max-lg:inset-x-0 max-lg:bottom-0 max-lg:z-30 max-lg:overflow-y-auto max-lg:border-t-2 max-lg:border-ink max-lg:bg-paper",
            carried ? "max-lg:pointer-events-none max-lg:max-h-24" : "max-lg:max-h-[58dvh]",
            "lg:grid lg:gap-4",
          )}
        >
          {pending ? (
            <Box label="Knock-on">
              <KnockOnRail desk={desk} pending={pending} heading={heading} />
            </Box>
          ) : null}
          {selected !== null && !carried ? (
            <Box label="Details">
              <SessionDetails
                desk={desk}
                id={selected}
                onEdit={onEdit}
                onClose={() => desk.dispatch({ type: "select", id: null })}
              />
            </Box>
          ) : null}
        </div>
      ) : null}
      {saving ? (
        <p role="status" className="rounded-md border border-line bg-paper px-4 py-3 text-sm">
          Saving …
        </p>
      ) : null}
      {pending ? null : <Idle desk={desk} />}
    </aside>
  );
}
