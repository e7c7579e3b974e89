import { listenCampChanges, type CampChanged } from "@/db/listen";
import { env } from "@/lib/env";
import { logger } from "@/lib/logger";

type Listener = (change: CampChanged) => void;

interface Hub {
  readonly listeners: Map<string, Set<Listener>>;
  started: Promise<unknown> | null;
}

// One hub a process, kept across hot reloads in development.
const holder = globalThis as typeof globalThis & { campHub?: Hub };
const hub = (): Hub => (holder.campHub ??= { listeners: new Map(), started: null });

async function start({ listeners }: Hub): Promise<void> {
  await listenCampChanges(env().DATABASE_URL, (change) => {
    for (const listener of listeners.get(change.campId) ?? []) listener(change);
  });
}

/** Calls `listener` for each new revision of a camp until the returned function is called. */
export function followCamp(campId: string, listener: Listener): () => void {
  const current = hub();
  current.started ??= start(current).catch((error: unknown) => {
    // The page falls back to polling; the next subscriber tries again.
    logger.error({ error }, "cannot listen for camp changes");
    current.started = null;
  });
  const set = current.listeners.get(campId) ?? new Set<Listener>();
  current.listeners.set(campId, set.add(listener));
  return () => {
    set.delete(listener);
    if (set.size === 0) current.listeners.delete(campId);
  };
}

/** Server-sent events of a camp: one `data: {"revision": n}` a revision, and a comment every 20 s so that proxies keep the line open. */
export function campEvents(
  campId: string,
  revision: number,
  signal: AbortSignal,
): ReadableStream<Uint8Array> {
  const encoder = new TextEncoder();
  return new ReadableStream({
    start(controller) {
      const send = (text: string) => controller.enqueue(encoder.encode(text));
      send(`retry: 2000\ndata: ${JSON.stringify({ revision })}\n\n`);
      const stop = followCamp(campId, (change) =>
        send(`data: ${JSON.stringify({ revision: change.revision })}\n\n`),
      );
      const beat = setInterval(() => send(": still here\n\n"), 20_000);
      signal.addEventListener("abort", () => {
        clearInterval(beat);
        stop();
        controller.close();
      });
    },
  });
}
