"use client";

import { useRouter } from "next/navigation";
import { Panel } from "@/components/ui/panel";
import { showToast } from "@/components/ui/toasts";
import { useAddExercise } from "@/lib/query/exercises";
import type { ExerciseForm as Form } from "@/lib/schemas/exercise";
import { ExerciseForm } from "./exercise-form";
import { FRESH_DOSES } from "./fresh-doses";

const START: Form = {
  name: "",
  qualities: [],
  main: false,
  load: "reserve",
  bestOf: null,
  powerZone: null,
  sides: "both",
  intent: "controlled",
  doses: { heavy: null, volume: FRESH_DOSES.volume, fast: null, hold: null },
  rest: 90,
  equipment: [],
  ruledOutBy: [],
  order: "any",
  stretch: null,
  easier: null,
  harder: null,
  cues: [],
};

export function NewExercise() {
  const router = useRouter();
  const add = useAddExercise();
  return (
    <Panel title="Add an exercise">
      <ExerciseForm
        id={null}
        start={START}
        act="Add the exercise"
        save={async (form) => {
          const { id } = await add.mutateAsync(form);
          showToast(`${form.name} is among the exercises.`);
          router.push(`/exercises/${encodeURIComponent(id)}`);
        }}
        onClose={() => router.push("/exercises")}
      />
    </Panel>
  );
}
