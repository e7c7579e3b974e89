import type { Metadata } from "next";
import { NewExercise } from "@/components/exercises/new-exercise";
import { pageContext } from "@/lib/http/page";

export const metadata: Metadata = { title: "Add an exercise" };

export default async function NewExercisePage() {
  await pageContext("exercises.write");
  return <NewExercise />;
}
