"use client";

import { useState } from "react";
import { Button } from "@/components/ui/button";
import { Actions, Dialog } from "@/components/ui/dialog";
import { Notice } from "@/components/ui/notice";
import { showToast } from "@/components/ui/toasts";
import { useRestoreExercise } from "@/lib/query/exercises";
import type { ExerciseView } from "@/lib/schemas/exercise";

/** Goes back to the library's form, once that was confirmed. */
export function RestoreButton({ view }: { readonly view: ExerciseView }) {
  const [asking, setAsking] = useState(false);
  const restore = useRestoreExercise(view);
  const { name } = view.exercise;
  const run = (): void =>
    restore.mutate(undefined, {
      onSuccess: () => {
        showToast(`${name} stands as the library has it.`);
        setAsking(false);
      },
    });
  return (
    <>
      <Button size="small" onClick={() => setAsking(true)}>
        Go back to the library’s form
      </Button>
      <Dialog
        open={asking}
        onOpenChange={setAsking}
        title={`Go back to the library’s form of ${name}?`}
        description="The team’s changes stay in its history, and what was logged stays as it was."
      >
        {restore.error ? <Notice tone="error" role="alert" title={restore.error.message} /> : null}
        <Actions className="mt-0!">
          <Button variant="primary" busy={restore.isPending} onClick={run}>
            Go back
          </Button>
          <Button onClick={() => setAsking(false)}>Keep the team’s form</Button>
        </Actions>
      </Dialog>
    </>
  );
}
