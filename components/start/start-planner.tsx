"use client";

import { useState, type ReactNode } from "react";
import { CampGrid } from "@/components/session/camp-grid";
import { KindLegend, legendOf } from "@/components/session/kind-legend";
import { Button } from "@/components/ui/button";
import { LinkButton } from "@/components/ui/link-button";
import { LiveRegion } from "@/components/ui/live-region";
import type { Instant } from "@/lib/engine/types";
import { writeStartParams, type StartParams } from "@/lib/schemas/start-params";
import { StartForm } from "./start-form";
import { StartRemarks } from "./start-remarks";
import { useAddress } from "@/components/ui/use-address";
import { useStartPlan, type StartCamp, type StartProblems } from "./use-start-plan";
import { useBrowserZone } from "./use-zone";

interface StartPlannerProps {
  /** Headline and lead, above the form. */
  readonly children: ReactNode;
  readonly initial: StartParams;
  /** The server's clock, so that both lay out the same camp. */
  readonly now: Instant;
}

const FORM_ID = "start-form";

const focusFirstProblem = (): void =>
  document.querySelector<HTMLElement>(`#${FORM_ID} [aria-invalid="true"]`)?.focus();

function KeepButton({ query, problems }: { readonly query: string; readonly problems: StartProblems }) {
  if (Object.keys(problems).length > 0) {
    return (
      <Button variant="primary" wide onClick={focusFirstProblem}>
        Keep this camp
      </Button>
    );
  }
  return (
    <LinkButton variant="primary" wide href={`/sign-up?camp=${encodeURIComponent(query)}`} prefetch={false}>
      Keep this camp
    </LinkButton>
  );
}

const summary = ({ plan }: StartCamp): string => {
  const sets = plan.weeks.reduce((sum, week) => sum + week.sets, 0);
  const weeks = plan.weeks.length === 1 ? "1 week" : `${plan.weeks.length} weeks`;
  return `${weeks}, ${plan.lifts.length} lifts, ${sets} working sets`;
};

function StartCampView({ camp, stale }: { readonly camp: StartCamp; readonly stale: boolean }) {
  const { plan, input, today } = camp;
  return (
    <div className={stale ? "grayscale" : undefined}>
      <div className="mb-2 flex flex-wrap items-baseline justify-between gap-x-4">
        <h2 className="font-semibold">{summary(camp)}</h2>
        <p className="text-sm text-ink-2">
          {stale
            ? "Shown as it was: one of the fields is wrong."
            : "Press a session to see why it stands there."}
        </p>
      </div>
      <CampGrid plan={plan} sport={input.sport} weighIn={input.weighIn} today={today} />
      <div className="mt-2">
        <KindLegend entries={legendOf(plan, input.sport, input.weighIn !== null)} />
      </div>
      <StartRemarks plan={plan} />
      <LiveRegion>{stale ? "" : `Camp laid out: ${summary(camp)}.`}</LiveRegion>
    </div>
  );
}

/** The planner without an account: inputs left, camp right, laid out in the browser at every change. */
export function StartPlanner({ children, initial, now }: StartPlannerProps) {
  const [params, setParams] = useState(initial);
  const here = useBrowserZone();
  const zone = params.zone ?? here;
  const { camp, problems, stale } = useStartPlan(params, zone, now);
  const query = writeStartParams({ ...params, zone });
  useAddress(query);
  const weeksGone = camp ? camp.plan.weeks.filter((week) => week.to < camp.today).length : 0;
  return (
    <div className="grid items-start gap-x-11 gap-y-8 lg:grid-cols-[minmax(0,430px)_minmax(0,1fr)] xl:grid-cols-[minmax(0,470px)_minmax(0,1fr)]">
      <div>
        {children}
        <form
          id={FORM_ID}
          method="get"
          action="/"
          noValidate
          className="rounded-md border border-line bg-paper px-5 pt-4.5 pb-5"
        >
          <StartForm
            params={params}
            problems={problems}
            zone={zone}
            weeksGone={weeksGone}
            onChange={(change) => setParams((before) => ({ ...before, ...change }))}
          />
          <noscript>
            <button
              type="submit"
              className="mt-4 min-h-control w-full rounded border border-ink font-semibold"
            >
              Lay it out
            </button>
          </noscript>
          <div className="mt-4">
            <KeepButton query={query} problems={problems} />
          </div>
        </form>
      </div>
      {camp ? <StartCampView camp={camp} stale={stale} /> : null}
    </div>
  );
}
