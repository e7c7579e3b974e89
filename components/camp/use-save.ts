"use client";

import { useMutation, useQueryClient } from "@tanstack/react-query";
import type { Dispatch } from "react";
import { showToast } from "@/components/ui/toasts";
import type { Preview } from "@/lib/book/preview-result";
import { campQuery, saveChange, staleProblem } from "@/lib/query/camps";
import type { CampView, SaveAnswer } from "@/lib/schemas/camp";
import type { DeskStep, Pending } from "./desk-state";
import { optimisticView } from "./picture";
import { toldText } from "./words";

interface Save {
  readonly pending: Pending;
  readonly preview: Preview;
  readonly view: CampView;
}

/**
 * Saves the change that is being tried: the page shows it as saved at once, and takes it back where the server refuses.
 * A stale save leaves the change on the desk, measured against what others saved meanwhile.
 */
export function useSave(campId: string, dispatch: Dispatch<DeskStep>, onPutBack: (revision: number) => void) {
  const client = useQueryClient();
  const { queryKey } = campQuery(campId);
  const show = (view: CampView): void => void client.setQueryData(queryKey, view);

  return useMutation<SaveAnswer, Error, Save>({
    mutationFn: ({ pending, view }) =>
      saveChange(campId, {
        change: pending.change,
        baseRevision: view.revision,
        idempotencyKey: pending.key,
      }),
    onMutate: async ({ view, preview }) => {
      dispatch({ type: "saving" });
      await client.cancelQueries({ queryKey });
      show(optimisticView(view, preview));
    },
    onSuccess: (answer) => {
      show(answer.view);
      dispatch({ type: "saved", revision: answer.revision });
      const putBack = answer.view.may.includes("camps.put-back");
      showToast(toldText(answer.told), {
        ...(putBack && { action: { label: "Put back", run: () => onPutBack(answer.revision) } }),
      });
    },
    onError: (error, { view }) => {
      const stale = staleProblem(error);
      show(stale?.view ?? view);
      dispatch({
        type: "refused",
        refusal: stale ? null : error.message,
        missed: stale?.changes ?? [],
        seen: stale?.revision ?? 0,
      });
    },
  });
}
