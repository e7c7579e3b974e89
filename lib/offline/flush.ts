import type { Entry, Stuck } from "./entry";
import { nextToSend, refused, sent, trying } from "./queue";
import type { LogView } from "@/lib/schemas/today";
import type { QueueStore } from "./queue-store";

/** What became of one write. */
export type Outcome =
  | { readonly is: "sent"; readonly version: number | null }
  | { readonly is: "stuck"; readonly stuck: Stuck }
  /** No answer, or a server that cannot answer now. */
  | { readonly is: "unreachable" }
  | { readonly is: "signed-out" };

export interface Delivery {
  readonly send: (entry: Entry) => Promise<Outcome>;
  /** Called before the entry leaves the queue, so that the page never shows neither. */
  readonly onSent: (entry: Entry, version: number | null) => Promise<void>;
  /** Called before a stale entry is put aside: the page then knows what it was changed to. */
  readonly onStale: (entry: Entry, theirs: LogView) => Promise<void>;
}

/** How a round ended: all that could be sent is sent, or what stood in the way. */
export type Round = "done" | "unreachable" | "signed-out";

/**
 * Sends what waits, in order, one at a time. Each write is marked as tried before it leaves, and carries its own key: one
 * that arrived although its answer was lost is repeated as it was and changes nothing.
 */
export async function flush(store: Pick<QueueStore, "read" | "change">, delivery: Delivery): Promise<Round> {
  for (;;) {
    // Read inside the change: a write that was replaced a moment ago must not be sent any more.
    let key: string | null = null;
    const queue = await store.change((waiting) => {
      key = nextToSend(waiting)?.key ?? null;
      return key === null ? waiting : trying(waiting, key);
    });
    const entry = queue.find((candidate) => candidate.key === key);
    if (!entry) return "done";
    const outcome = await delivery.send(entry);
    if (outcome.is === "unreachable" || outcome.is === "signed-out") return outcome.is;
    if (outcome.is === "sent") {
      await delivery.onSent(entry, outcome.version);
      await store.change((waiting) => sent(waiting, entry.key, outcome.version));
    } else {
      if (outcome.stuck.why === "stale") await delivery.onStale(entry, outcome.stuck.theirs);
      await store.change((waiting) => refused(waiting, entry.key, outcome.stuck));
    }
  }
}
