"use client";

import { toldText } from "@/components/camp/words";
import type { Desk } from "@/components/camp/use-desk";
import { usePutBack } from "@/components/camp/use-put-back";
import { showToast } from "@/components/ui/toasts";
import { staleProblem } from "@/lib/query/camps";
import { useAcceptSuggestion, useDismissSuggestion } from "@/lib/query/suggestions";
import type { AcceptAnswer } from "@/lib/schemas/suggestion";

const failed = (error: Error): void =>
  showToast(
    staleProblem(error)
      ? "Someone else changed this camp meanwhile. Look at its effect again."
      : error.message,
    { tone: "error" },
  );

/** Accepting and dismissing, with what the page says of it: a change that was made can be put back from there. */
export function useDecide({ view, dispatch }: Pick<Desk, "view" | "dispatch">) {
  const putBack = usePutBack(view.id, dispatch);
  const told = ({ saved }: AcceptAnswer): void => {
    if (saved === null) {
      showToast("Accepted as seen. The plan stays as it is.");
      return;
    }
    // Told of here, so that it is no news from someone else when the camp is read again.
    dispatch({ type: "saved", revision: saved.revision });
    showToast(toldText(saved.told, "Accepted"), {
      action: { label: "Put back", run: () => putBack.mutate(saved.revision) },
    });
  };
  const accepting = useAcceptSuggestion(view.id, told);
  const dismissing = useDismissSuggestion(view.id);
  return {
    busy: accepting.isPending || dismissing.isPending,
    accept: (key: string, baseRevision: number, note: string): void =>
      accepting.mutate({ key, baseRevision, note, idempotencyKey: crypto.randomUUID() }, { onError: failed }),
    dismiss: (key: string, reason: string): void =>
      dismissing.mutate(
        { key, reason },
        { onError: failed, onSuccess: () => showToast("Dismissed. The plan stays as it is.") },
      ),
  };
}
