"use client";

import { zodResolver } from "@hookform/resolvers/zod";
import { useRouter } from "next/navigation";
import { useState } from "react";
import { FormProvider, useForm, useWatch } from "react-hook-form";
import { CampGrid } from "@/components/session/camp-grid";
import { KindLegend, legendOf } from "@/components/session/kind-legend";
import { StartRemarks } from "@/components/start/start-remarks";
import { Button } from "@/components/ui/button";
import { LiveRegion } from "@/components/ui/live-region";
import { Notice } from "@/components/ui/notice";
import type { PlannedCamp } from "@/lib/book";
import type { Instant } from "@/lib/engine/types";
import { createCamp } from "@/lib/query/camps";
import { ProblemError, type Problem } from "@/lib/query/send";
import type { CampBook } from "@/lib/schemas/camp-book";
import { BoutFields } from "../dialogs/bout-fields";
import { todayOf } from "../today";
import { AthleteFields, LiftingFields, type AthleteChoice } from "./athlete-fields";
import { formOfDraft, type Draft } from "./draft";
import { draftSchema } from "./draft-schema";
import { FormPart } from "./form-part";
import { SportRows } from "./sport-rows";
import { useLaidOut } from "./use-laid-out";

interface NewCampProps {
  readonly initial: Draft;
  readonly athletes: readonly AthleteChoice[];
  /** The team's own values of house rules. */
  readonly rules: CampBook["rules"];
  readonly now: Instant;
}

function LaidOut({
  camp,
  problem,
  today,
}: {
  readonly camp: PlannedCamp;
  readonly problem: string | null;
  readonly today: Parameters<typeof CampGrid>[0]["today"];
}) {
  const { plan, input } = camp;
  const sets = plan.weeks.reduce((sum, week) => sum + week.sets, 0);
  const summary = `${plan.lifts.length} lifts, ${sets} working sets`;
  return (
    <div className={problem ? "opacity-60" : undefined}>
      <h2 className="mb-2 font-semibold">{summary}</h2>
      <CampGrid plan={plan} sport={input.sport} weighIn={input.weighIn} today={today} />
      <div className="mt-2">
        <KindLegend entries={legendOf(plan, input.sport)} />
      </div>
      <StartRemarks plan={plan} />
      <LiveRegion>{problem ? "" : `Camp laid out: ${summary}.`}</LiveRegion>
    </div>
  );
}

function Refused({ problem }: { readonly problem: Problem }) {
  return (
    <Notice role="alert" tone="error" title="Not kept" className="mt-4">
      <p>{problem.detail ?? problem.title}</p>
      <ul>
        {problem.errors?.map((error) => (
          <li key={error.pointer + error.message}>{error.message}</li>
        ))}
      </ul>
    </Notice>
  );
}

/** A new camp: inputs left, the camp right, laid out in the browser at every change. */
export function NewCamp({ initial, athletes, rules, now }: NewCampProps) {
  const router = useRouter();
  const [refused, setRefused] = useState<Problem | null>(null);
  const form = useForm<Draft>({ resolver: zodResolver(draftSchema), defaultValues: initial });
  // The form's own values, not a copy of some of them: whatever changes lays the camp out again.
  const draft = useWatch({ control: form.control }) as Draft;
  const { camp, problem } = useLaidOut(draft, rules, now);
  const keep = form.handleSubmit(async (values) => {
    setRefused(null);
    try {
      const { id } = await createCamp(formOfDraft(values));
      router.push(`/camps/${id}`);
    } catch (error) {
      if (!(error instanceof ProblemError)) throw error;
      setRefused(error.problem);
    }
  });
  return (
    <div className="grid items-start gap-x-9 gap-y-8 lg:grid-cols-[minmax(0,430px)_minmax(0,1fr)] xl:grid-cols-[minmax(0,470px)_minmax(0,1fr)]">
      <FormProvider {...form}>
        <form
          noValidate
          onSubmit={(event) => void keep(event)}
          className="rounded-md border border-line bg-paper px-5 pt-1 pb-5"
        >
          <FormPart title="Athlete">
            <AthleteFields athletes={athletes} />
          </FormPart>
          <FormPart title="Bout">
            <BoutFields />
          </FormPart>
          <FormPart title="The sport’s week">
            <SportRows />
          </FormPart>
          <FormPart title="Lifting">
            <LiftingFields />
          </FormPart>
          {problem ? (
            <Notice tone="caution" className="mt-4">
              {problem}
            </Notice>
          ) : null}
          {refused ? <Refused problem={refused} /> : null}
          <Button type="submit" variant="primary" wide className="mt-5" busy={form.formState.isSubmitting}>
            Keep this camp
          </Button>
        </form>
      </FormProvider>
      <div className="lg:sticky lg:top-3">
        {camp ? (
          <LaidOut camp={camp} problem={problem} today={todayOf({ homeZone: draft.homeZone }, now)} />
        ) : null}
      </div>
    </div>
  );
}
