"use client";

import { queryOptions, useQuery } from "@tanstack/react-query";
import type { ExerciseEdit, ExerciseForm, ExerciseSummary, ExerciseView } from "@/lib/schemas/exercise";
import { sendJson } from "./send";
import { useChange } from "./use-change";

const URL = "/api/exercises";
const exerciseUrl = (id: string): string => `${URL}/${encodeURIComponent(id)}`;

// Lists and single ones lie under one key: whatever changes is read again in both.
const ALL = ["exercises"] as const;

const listQuery = queryOptions({
  queryKey: [...ALL, "list"],
  queryFn: async () => (await sendJson<{ exercises: readonly ExerciseSummary[] }>(URL)).exercises,
});
const exerciseQuery = (id: string) =>
  queryOptions({ queryKey: [...ALL, "one", id], queryFn: () => sendJson<ExerciseView>(exerciseUrl(id)) });

/** The team's exercises; `initial` is what the server rendered. */
export const useExercises = (initial: readonly ExerciseSummary[]) =>
  useQuery({ ...listQuery, initialData: initial });

/** The same below a page that has asked for them. */
export const useKnownExercises = (): readonly ExerciseSummary[] => useQuery(listQuery).data ?? [];

/** One exercise with its history; `initial` is what the server rendered. */
export const useExercise = (initial: ExerciseView) =>
  useQuery({ ...exerciseQuery(initial.exercise.id), initialData: initial });

export const useAddExercise = () =>
  useChange((form: ExerciseForm) => sendJson<{ id: string }>(URL, form), ALL);

export const useSaveExercise = (id: string) =>
  useChange((edit: ExerciseEdit) => sendJson<ExerciseView>(exerciseUrl(id), edit, "PUT"), ALL);

/** Takes an exercise out of use in the team, or brings it back. */
export const useShelveExercise = ({ exercise, changedAt }: ExerciseSummary) =>
  useChange(
    (shelved: boolean) =>
      sendJson<ExerciseView>(`${exerciseUrl(exercise.id)}/shelve`, { shelved, changedAt }),
    ALL,
  );

/** Goes back to the library's form. */
export const useRestoreExercise = ({ exercise, changedAt }: ExerciseSummary) =>
  useChange(() => sendJson<ExerciseView>(`${exerciseUrl(exercise.id)}/restore`, { changedAt }), ALL);
