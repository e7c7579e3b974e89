import type { Metadata } from "next";
import { cache } from "react";
import { ExercisePage } from "@/components/exercises/exercise-page";
import { orNotFound, pageContext } from "@/lib/http/page";
import { can } from "@/lib/policy";
import { readExercise } from "@/lib/services/exercises/read";

interface PageProps {
  readonly params: Promise<{ id: string }>;
}

// The title and the page ask for the same exercise; it is read once.
const exerciseOf = cache(async (id: string) => {
  const ctx = await pageContext("exercises.read");
  return { ctx, view: await orNotFound(readExercise(ctx, { params: { id } })) };
});

export async function generateMetadata({ params }: PageProps): Promise<Metadata> {
  const { view } = await exerciseOf((await params).id);
  return { title: view.exercise.name };
}

export default async function Page({ params }: PageProps) {
  const { ctx, view } = await exerciseOf((await params).id);
  return <ExercisePage key={view.exercise.id} initial={view} edits={can(ctx.member, "exercises.write")} />;
}
