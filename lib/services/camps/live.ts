import { listenCampChanges, type CampChanged } from "@/db/listen";
import { env } from "@/lib/env";
import { logger } from "@/lib/logger";
import type { TeamContext } from "@/lib/services/context";
import { loadCamp } from "./load";

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

/** Proxies close a line on which nothing is said. */
const BEAT_MS = 20_000;

/** One `data: {"revision": n}` a revision, from the present one on, and a comment now and then that keeps the line open. */
function eventStream(campId: string, revision: number, signal: AbortSignal): ReadableStream<Uint8Array> {
  const encoder = new TextEncoder();
  let stop = (): void => undefined;
  let cancelled = false;
  return new ReadableStream({
    start(controller) {
      const send = (text: string) => controller.enqueue(encoder.encode(text));
      send(`retry: 2000\ndata: ${JSON.stringify({ revision })}\n\n`);
      const unfollow = followCamp(campId, (change) =>
        send(`data: ${JSON.stringify({ revision: change.revision })}\n\n`),
      );
      const beat = setInterval(() => send(": still here\n\n"), BEAT_MS);
      stop = () => {
        clearInterval(beat);
        unfollow();
      };
      // The reader may have cancelled before the request is told to be over.
      signal.addEventListener("abort", () => {
        stop();
        if (!cancelled) controller.close();
      });
    },
    cancel: () => {
      cancelled = true;
      stop();
    },
  });
}

/** Server-sent events of a camp that the member may see. */
export async function campEvents(
  ctx: TeamContext,
  { params, signal }: { params: Record<string, string>; signal: AbortSignal },
): Promise<Response> {
  const { row } = await loadCamp(ctx.db, ctx, params.id ?? "");
  return new Response(eventStream(row.id, row.revision, signal), {
    headers: {
      "content-type": "text/event-stream; charset=utf-8",
      "cache-control": "no-store, no-transform",
      // nginx would hold events back.
      "x-accel-buffering": "no",
    },
  });
}
