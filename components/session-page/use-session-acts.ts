"use client";

import { showToast } from "@/components/ui/toasts";
import type { LiftEdit } from "@/lib/engine/prescription/types";
import { useDropSwap, useSaveEdit, useSwap } from "@/lib/query/prescription";
import { ProblemError } from "@/lib/query/send";
import type { LineView, SessionPageView } from "@/lib/schemas/prescription";

const EMPTY: LiftEdit = { lines: {} };
const fail = (error: Error): void => showToast(error.message, { tone: "error" });

/** What a reader does to a session; each act can be put back from the message that follows it. */
export function useSessionActs(view: SessionPageView) {
  const { campId, session, lift } = view;
  const save = useSaveEdit(campId, session.id);
  const swap = useSwap(campId);
  const back = useDropSwap(campId);
  const standing = lift?.edit ?? null;

  /** Saves an edit. Gives back what is wrong, by the last part of the pointer; null where it was saved or said elsewhere. */
  const saveEdit = async (edit: LiftEdit): Promise<Readonly<Record<string, string>> | null> => {
    const before = standing?.edit ?? EMPTY;
    try {
      const answer = await save.mutateAsync({ base: standing?.changedAt ?? null, edit });
      const undo = (): void =>
        save.mutate({ base: answer.lift?.edit?.changedAt ?? null, edit: before }, { onError: fail });
      showToast("Saved; the athlete sees it at once.", { action: { label: "Put back", run: undo } });
      return null;
    } catch (error) {
      if (!(error instanceof ProblemError)) throw error;
      const errors = error.problem.errors ?? [];
      if (errors.length === 0) fail(error);
      const named = errors.map(({ pointer, message }) => [pointer.split("/").at(-1) ?? "", message] as const);
      return Object.fromEntries(named);
    }
  };

  const item = lift?.lift.item;
  const swapFor = (line: LineView, to: string, name: string): void => {
    if (!item) return;
    const from = line.swappedFrom?.id ?? line.exercise;
    const undo = (): void => {
      // A swap in place of an earlier one goes back to that one.
      if (line.swappedFrom) swap.mutate({ item, from, to: line.exercise }, { onError: fail });
      else back.mutate({ item, from }, { onError: fail });
    };
    const done = (): void =>
      showToast(`${name} stands in for ${line.name}.`, { action: { label: "Put back", run: undo } });
    swap.mutate({ item, from, to }, { onSuccess: done, onError: fail });
  };

  const putSwapBack = (line: LineView): void => {
    if (!item || !line.swappedFrom) return;
    const from = line.swappedFrom.id;
    const again = (): void => swap.mutate({ item, from, to: line.exercise }, { onError: fail });
    const done = (): void =>
      showToast(`${line.swappedFrom?.name ?? "It"} takes its turns again.`, {
        action: { label: "Swap again", run: again },
      });
    back.mutate({ item, from }, { onSuccess: done, onError: fail });
  };

  return { saveEdit, swapFor, putSwapBack, busy: save.isPending || swap.isPending || back.isPending };
}
export type SessionActs = ReturnType<typeof useSessionActs>;
