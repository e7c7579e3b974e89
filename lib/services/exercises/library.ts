import type { Database } from "@/db/client";
import { replaceLibrary } from "@/db/queries/exercises";
import { EXERCISES } from "@/db/seed/exercises";

/**
 * Brings the exercise library of the database to what this version ships. Safe for several processes at once, and
 * nothing is written where nothing differs. Teams' own forms stay as they are.
 */
export async function ensureLibrary(db: Database): Promise<void> {
  await replaceLibrary(db, EXERCISES);
}
