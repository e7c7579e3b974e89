"use client";

import { useMutation, useQueryClient } from "@tanstack/react-query";
import { useState } from "react";
import { EmptyState } from "@/components/ui/empty-state";
import { Notice } from "@/components/ui/notice";
import { showToast } from "@/components/ui/toasts";
import { changesQuery, saveChange, useChanges } from "@/lib/query/camps";
import { useCampLive } from "@/lib/query/use-camp-live";
import type { ChangeView } from "@/lib/schemas/camp";
import { toldText } from "../words";
import { ChangeRow } from "./change-row";

interface ChangeListProps {
  readonly campId: string;
  readonly zone: string;
  readonly initial: readonly ChangeView[];
  /** Whether this reader may put changes back. */
  readonly putsBack: boolean;
}

function usePutBack(campId: string, newest: number) {
  const client = useQueryClient();
  return useMutation<Awaited<ReturnType<typeof saveChange>>, Error, number>({
    mutationFn: (revision) =>
      saveChange(campId, {
        change: { kind: "put-back", revision },
        baseRevision: newest,
        idempotencyKey: crypto.randomUUID(),
      }),
    onSuccess: (answer) => showToast(toldText(answer.told, "Put back")),
    onSettled: () => client.invalidateQueries({ queryKey: changesQuery(campId).queryKey }),
  });
}

/** Every saved change of a camp, newest first, each with what it knocked on and a way back. */
export function ChangeList({ campId, zone, initial, putsBack }: ChangeListProps) {
  useCampLive(campId);
  const { data: changes } = useChanges(campId, initial);
  const newestFirst = [...changes].sort((a, b) => b.number - a.number);
  const putBack = usePutBack(campId, newestFirst[0]?.number ?? 0);
  const [asked, setAsked] = useState<number | null>(null);
  if (newestFirst.length === 0) {
    return (
      <EmptyState title="No changes yet">Everything that is saved in this camp is listed here.</EmptyState>
    );
  }
  return (
    <>
      {putBack.error ? (
        <Notice role="alert" tone="error" title="Not put back" className="mb-3">
          {putBack.error.message}
        </Notice>
      ) : null}
      <ol className="grid gap-2">
        {newestFirst.map((change) => (
          <ChangeRow
            key={change.number}
            change={change}
            zone={zone}
            asked={asked === change.number}
            busy={putBack.isPending}
            onAsk={putsBack ? () => setAsked(asked === change.number ? null : change.number) : null}
            onPutBack={() => {
              setAsked(null);
              putBack.mutate(change.number);
            }}
          />
        ))}
      </ol>
    </>
  );
}
