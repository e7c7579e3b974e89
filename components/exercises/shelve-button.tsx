"use client";

import { Button } from "@/components/ui/button";
import { showToast } from "@/components/ui/toasts";
import { useShelveExercise } from "@/lib/query/exercises";
import type { ExerciseView } from "@/lib/schemas/exercise";

/** Takes an exercise out of use, or brings it back. It can be undone by the same button, so nothing is asked. */
export function ShelveButton({ view }: { readonly view: ExerciseView }) {
  const shelve = useShelveExercise(view);
  const { exercise, shelved } = view;
  const run = (): void =>
    shelve.mutate(!shelved, {
      onSuccess: () =>
        showToast(
          shelved
            ? `${exercise.name} is back in use.`
            : `${exercise.name} is shelved: no session is filled with it.`,
        ),
      onError: (error) => showToast(error.message, { tone: "error" }),
    });
  return (
    <Button size="small" busy={shelve.isPending} onClick={run}>
      {shelved ? "Bring it back" : "Shelve it"}
    </Button>
  );
}
