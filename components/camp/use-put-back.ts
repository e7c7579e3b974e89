"use client";

import { useMutation, useQueryClient } from "@tanstack/react-query";
import type { Dispatch } from "react";
import { showToast } from "@/components/ui/toasts";
import { campQuery, saveChange } from "@/lib/query/camps";
import type { SaveAnswer } from "@/lib/schemas/camp";
import type { DeskStep } from "./desk-state";
import { toldText } from "./words";

/** Undoes a saved revision as a new one, from the message that follows a save. */
export function usePutBack(campId: string, dispatch: Dispatch<DeskStep>) {
  const client = useQueryClient();
  const { queryKey } = campQuery(campId);
  return useMutation<SaveAnswer, Error, number>({
    mutationFn: (revision) =>
      saveChange(campId, {
        change: { kind: "put-back", revision },
        baseRevision: client.getQueryData(queryKey)?.revision ?? revision,
        idempotencyKey: crypto.randomUUID(),
      }),
    onSuccess: (answer) => {
      client.setQueryData(queryKey, answer.view);
      dispatch({ type: "saved", revision: answer.revision });
      showToast(toldText(answer.told, "Put back"));
    },
    onError: (error) => {
      showToast(error.message, { tone: "error" });
      void client.invalidateQueries({ queryKey });
    },
  });
}
