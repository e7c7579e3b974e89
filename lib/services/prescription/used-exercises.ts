import { listExercises } from "@/db/queries/exercises";
import type { Tx } from "@/db/client";
import type { Exercise } from "@/lib/engine";

/** Exercises that a team prescribes: shelved ones left out. */
export const usedExercises = async (tx: Tx, teamId: string): Promise<Exercise[]> =>
  (await listExercises(tx, teamId)).flatMap(({ exercise, shelved }) => (shelved ? [] : [exercise]));
