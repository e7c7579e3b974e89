import { get, update } from "idb-keyval";
import type { Queue } from "./queue";

const NOTHING: Queue = [];

/** Key of a person's queue in the browser's database. */
export const queueKey = (userId: string): string => `bellward-queue:${userId}`;

/** A person's queue on this phone: in IndexedDB, the same in every tab. */
export interface QueueStore {
  readonly userId: string;
  readonly subscribe: (listener: () => void) => () => void;
  readonly read: () => Queue;
  /** What a page shows before it has looked. */
  readonly readEmpty: () => Queue;
  /** Applies `change` at once for the eyes and in one transaction for good; gives back what was stored. */
  readonly change: (change: (queue: Queue) => Queue) => Promise<Queue>;
  /** False where the browser refuses to keep anything: entries then live as long as the page. */
  readonly isDurable: () => boolean;
}

function openStore(userId: string): QueueStore {
  const key = queueKey(userId);
  const listeners = new Set<() => void>();
  let channel: BroadcastChannel | null = null;
  let opened = false;
  let queue = NOTHING;
  let durable = true;
  let pending = 0;

  const show = (next: Queue): void => {
    queue = next;
    for (const listener of listeners) listener();
  };
  const load = async (): Promise<void> => {
    try {
      const stored = await get<Queue>(key);
      // A change under way knows better.
      if (pending === 0 && stored) show(stored);
    } catch {
      durable = false;
    }
  };
  /** With the first listener, which only a browser has: a page is rendered on the server as well. */
  const open = (): void => {
    if (opened) return;
    opened = true;
    if (typeof BroadcastChannel !== "undefined") {
      channel = new BroadcastChannel(key);
      channel.onmessage = () => void load();
    }
    void load();
  };

  const store = async (change: (queue: Queue) => Queue): Promise<Queue> => {
    let next = queue;
    try {
      await update<Queue>(key, (stored) => (next = change(stored ?? NOTHING)));
    } catch {
      // Private windows of some browsers have no database: the page itself still remembers.
      durable = false;
    }
    return next;
  };

  return {
    userId,
    subscribe: (listener) => {
      listeners.add(listener);
      open();
      return () => listeners.delete(listener);
    },
    read: () => queue,
    readEmpty: () => NOTHING,
    isDurable: () => durable,
    change: async (change) => {
      pending += 1;
      show(change(queue));
      const stored = await store(change);
      pending -= 1;
      // What came after is already on the screen and on its way to the database.
      if (pending === 0 && durable) show(stored);
      channel?.postMessage("changed");
      return durable ? stored : queue;
    },
  };
}

const stores = new Map<string, QueueStore>();

/** The one store of a person in this page. */
export function queueOf(userId: string): QueueStore {
  const store = stores.get(userId) ?? openStore(userId);
  // On the server it lives as long as the rendering: nobody's queue is there.
  if (typeof window !== "undefined") stores.set(userId, store);
  return store;
}
