"use client";

import { useState } from "react";
import { CsvLink } from "@/components/charts/csv-link";
import { Button } from "@/components/ui/button";
import { Cell, HeadCell, Table } from "@/components/ui/table";
import { showToast } from "@/components/ui/toasts";
import { FROM_WORDS } from "@/lib/engine/prescription/wording";
import { massText } from "@/lib/format/load";
import { useAddBest, useBests, useRemoveBest } from "@/lib/query/record";
import type { BestView, BestsView } from "@/lib/schemas/prescription";
import { dateText } from "../words";
import { BestDialog } from "./best-dialog";
import { Section } from "./section";

interface BestsSectionProps {
  readonly athleteId: string;
  readonly initial: BestsView;
  readonly today: string;
}

/** Bests of each lift, newest first, with where each figure is from. */
export function BestsSection({ athleteId, initial, today }: BestsSectionProps) {
  const { data } = useBests(athleteId, initial);
  const [adding, setAdding] = useState(false);
  const remove = useRemoveBest(athleteId);
  const add = useAddBest(athleteId);
  const { unit } = data;
  const failed = (error: Error): void => showToast(error.message, { tone: "error" });
  const putBack = ({ exerciseId, date, liftedKg, reps, formula }: BestView): void =>
    add.mutate(
      { exerciseId, day: date, kg: liftedKg, reps, formula },
      { onError: failed, onSuccess: () => showToast("The best is back.") },
    );
  const drop = (best: BestView): void =>
    remove.mutate(best.id, {
      onError: failed,
      onSuccess: () =>
        showToast(`The best of ${best.name} is removed; older ones count again.`, {
          action: { label: "Put back", run: () => putBack(best) },
        }),
    });
  return (
    <Section
      id="bests"
      title="Bests"
      actions={
        <>
          {data.mayWrite && data.lifts.length > 0 ? (
            <Button size="small" onClick={() => setAdding(true)}>
              Add a best
            </Button>
          ) : null}
          {data.bests.length > 0 ? <CsvLink athleteId={athleteId} what="bests" /> : null}
        </>
      }
    >
      {data.bests.length === 0 ? (
        <p className="text-ink-2">None yet: sessions say repetitions in reserve until there is one.</p>
      ) : (
        <Table caption="Bests by lift">
          <thead>
            <tr>
              <HeadCell>Lift</HeadCell>
              <HeadCell>Best</HeadCell>
              <HeadCell>From</HeadCell>
              <HeadCell>Date</HeadCell>
              {data.mayWrite ? (
                <HeadCell>
                  <span className="sr-only">Act</span>
                </HeadCell>
              ) : null}
            </tr>
          </thead>
          <tbody>
            {data.bests.map((best) => (
              <tr key={best.id}>
                <HeadCell scope="row">{best.name}</HeadCell>
                <Cell className="whitespace-nowrap">{massText(best.kg, unit)}</Cell>
                <Cell>
                  {best.formula === null
                    ? "measured"
                    : `${massText(best.liftedKg, unit)} × ${best.reps}, ${FROM_WORDS[best.formula]}`}
                </Cell>
                <Cell className="whitespace-nowrap">{dateText(best.date)}</Cell>
                {data.mayWrite ? (
                  <Cell>
                    <Button
                      size="small"
                      variant="quiet"
                      aria-label={`Remove the best of ${best.name} of ${dateText(best.date)}`}
                      onClick={() => drop(best)}
                    >
                      Remove
                    </Button>
                  </Cell>
                ) : null}
              </tr>
            ))}
          </tbody>
        </Table>
      )}
      {adding ? (
        <BestDialog athleteId={athleteId} view={data} today={today} onClose={() => setAdding(false)} />
      ) : null}
    </Section>
  );
}
