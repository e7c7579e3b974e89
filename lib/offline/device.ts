import { del, get, set } from "idb-keyval";
import type { TodayView } from "@/lib/schemas/today";
import { CACHES } from "./cache-names";
import type { Queue } from "./queue";
import { queueKey } from "./queue-store";

// What a phone keeps of one person. Raise the number when the shape of the view changes: an old copy is then not read.
const viewKey = (userId: string): string => `bellward-today-1:${userId}`;
const OWNER = "bellward-owner";

/** The last view this phone has seen; null where there is none, or no database. */
export const keptView = async (userId: string): Promise<TodayView | null> =>
  (await get<TodayView>(viewKey(userId)).catch(() => undefined)) ?? null;

export const keepView = (userId: string, view: TodayView): Promise<void> =>
  set(viewKey(userId), view).catch(() => undefined);

/** Entries of the person who uses this phone that the server has not taken. */
export async function countWaiting(): Promise<number> {
  try {
    const owner = await get<string>(OWNER);
    return owner === undefined ? 0 : ((await get<Queue>(queueKey(owner)))?.length ?? 0);
  } catch {
    return 0;
  }
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
  const owner = await get<string>(OWNER).catch(() => undefined);
  await deleteCaches();
  if (owner === undefined) return;
  await Promise.all([del(viewKey(owner)), del(OWNER)]).catch(() => undefined);
}

/** Says who uses this phone now; what another person left to read goes. */
export async function claimDevice(userId: string): Promise<void> {
  const owner = await get<string>(OWNER).catch(() => undefined);
  if (owner === userId) return;
  if (owner !== undefined) await forgetReader();
  await set(OWNER, userId).catch(() => undefined);
}
