import type { ReactNode } from "react";
import { ExerciseDesk } from "@/components/exercises/exercise-desk";
import { pageContext } from "@/lib/http/page";
import { can } from "@/lib/policy";
import { listTeamExercises } from "@/lib/services/exercises/read";

/** The list stays while one exercise after the other is opened beside it. */
export default async function ExercisesLayout({ children }: { readonly children: ReactNode }) {
  const ctx = await pageContext("exercises.read");
  const { exercises } = await listTeamExercises(ctx);
  return (
    <ExerciseDesk initial={exercises} adds={can(ctx.member, "exercises.write")}>
      {children}
    </ExerciseDesk>
  );
}
