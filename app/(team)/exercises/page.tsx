import type { Metadata } from "next";
import { EmptyState } from "@/components/ui/empty-state";

export const metadata: Metadata = { title: "Exercises" };

/** Beside the list, before one is picked. */
export default function ExercisesPage() {
  return (
    <EmptyState title="Pick an exercise">
      Its cues, sets and what rules it out stand here, with what the team changed about it.
    </EmptyState>
  );
}
