import { delMany, get, set } from "idb-keyval";
import type { TodayView } from "@/lib/schemas/today";
import { CACHES } from "./cache-names";
import type { Queue } from "./queue";
import { queueKey } from "./queue-store";

// What a phone keeps of one person. Raise the number when the shape of the view changes: an old copy is then not read.
const viewKey = (userId: string): string => `bellward-today-1:${userId}`;
const OWNER = "bellward-owner";

/** A browser without a database, or that refuses it, keeps nothing and says nothing. */
async function tried<T>(work: () => Promise<T>): Promise<T | undefined> {
  try {
    return await work();
  } catch {
    return undefined;
  }
}

/** The last view this phone has seen; null where there is none, or no database. */
export const keptView = async (userId: string): Promise<TodayView | null> =>
  (await tried(() => get<TodayView>(viewKey(userId)))) ?? null;

export const keepView = (userId: string, view: TodayView): Promise<void> =>
  tried(() => set(viewKey(userId), view));

const ownerOf = (): Promise<string | undefined> => tried(() => get<string>(OWNER));

/** Entries of the person who uses this phone that the server has not taken. */
export async function countWaiting(): Promise<number> {
  const owner = await ownerOf();
  if (owner === undefined) return 0;
  return (await tried(() => get<Queue>(queueKey(owner))))?.length ?? 0;
}

async function deleteCaches(): Promise<void> {
  if (typeof caches === "undefined") return;
  await Promise.all([caches.delete(CACHES.pages), caches.delete(CACHES.answers)]);
}

/**
 * Removes what this phone keeps to read of the person who used it last. Entries that were never sent stay, under their
 * author's key: they are sent when that person signs in again.
 */
export async function forgetReader(): Promise<void> {
  const owner = await ownerOf();
  await deleteCaches();
  if (owner !== undefined) await tried(() => delMany([viewKey(owner), OWNER]));
}

/** Says who uses this phone now; what another person left to read goes. */
export async function claimDevice(userId: string): Promise<void> {
  const owner = await ownerOf();
  if (owner === userId) return;
  if (owner !== undefined) await forgetReader();
  await tried(() => set(OWNER, userId));
}
