"use client";

import { useSearchParams } from "next/navigation";
import { useState } from "react";
import { Button } from "@/components/ui/button";
import { Notice } from "@/components/ui/notice";
import { Panel } from "@/components/ui/panel";
import { showToast } from "@/components/ui/toasts";
import { useExercise, useKnownExercises, useSaveExercise } from "@/lib/query/exercises";
import { formOfExercise, type ExerciseView } from "@/lib/schemas/exercise";
import { ExerciseFacts } from "./exercise-facts";
import { ExerciseForm } from "./exercise-form";
import { ExerciseHistory } from "./exercise-history";
import { RestoreButton } from "./restore-button";
import { ShelveButton } from "./shelve-button";
import { originText, usedText } from "./words";

interface ExercisePageProps {
  readonly initial: ExerciseView;
  readonly edits: boolean;
}

function EditPanel({ view, onClose }: { readonly view: ExerciseView; readonly onClose: () => void }) {
  // What is being edited is what stood here when the form opened, whatever is read again meanwhile.
  const [start] = useState(view);
  const save = useSaveExercise(start.exercise.id);
  return (
    <Panel title={`Change ${start.exercise.name}`}>
      <p className="mb-3 text-sm text-ink-2">For this team alone. What was logged stays as it was.</p>
      <ExerciseForm
        id={start.exercise.id}
        start={formOfExercise(start.exercise)}
        act="Save the exercise"
        save={async (form) => {
          await save.mutateAsync({ ...form, changedAt: start.changedAt });
          showToast(`${form.name} is saved.`);
          onClose();
        }}
        onClose={onClose}
      />
    </Panel>
  );
}

/** One exercise: what it is, what the team changed, and the team's own acts on it. */
export function ExercisePage({ initial, edits }: ExercisePageProps) {
  const { data: view } = useExercise(initial);
  const exercises = useKnownExercises();
  const query = useSearchParams().toString();
  const [editing, setEditing] = useState(false);
  if (editing) return <EditPanel view={view} onClose={() => setEditing(false)} />;
  const { exercise, shelved, use } = view;
  const used = usedText(use);
  const lines = [originText(view), used && `Chosen or logged: ${used}`].filter(Boolean);
  return (
    <Panel
      title={exercise.name}
      actions={
        edits ? (
          <Button size="small" onClick={() => setEditing(true)}>
            Change
          </Button>
        ) : null
      }
    >
      {lines.map((line) => (
        <p key={line} className="text-sm text-ink-2">
          {line}
        </p>
      ))}
      {shelved ? (
        <Notice className="my-3" title="Shelved">
          No session is filled with it. What was logged with it stays.
        </Notice>
      ) : null}
      <ExerciseFacts exercise={exercise} exercises={exercises} query={query} />
      {edits ? (
        <div className="mt-4 flex flex-wrap gap-2 border-t border-line-soft pt-4">
          <ShelveButton view={view} />
          {view.origin === "changed" ? <RestoreButton view={view} /> : null}
        </div>
      ) : null}
      <ExerciseHistory history={view.history} exercises={exercises} />
    </Panel>
  );
}
