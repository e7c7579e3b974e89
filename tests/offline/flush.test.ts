import { describe, expect, it } from "vitest";
import type { Entry } from "@/lib/offline/entry";
import { flush, type Outcome } from "@/lib/offline/flush";
import { EMPTY_LOG } from "@/lib/offline/overlay";
import { enqueue, type Queue } from "@/lib/offline/queue";

const logOf = (key: string, note: string, sessionId = "lift-1"): Entry => ({
  key,
  madeAt: "2026-12-02T10:00:00.000Z",
  title: "Strength A",
  work: { kind: "log", campId: "camp", sessionId, baseVersion: 0, log: { ...EMPTY_LOG, note } },
  tried: false,
  stuck: null,
});

/** A store without a browser: changes apply one after the other, as IndexedDB's transactions do. */
function memoryStore(first: Queue) {
  let queue = first;
  return {
    read: () => queue,
    change: (change: (waiting: Queue) => Queue): Promise<Queue> => {
      queue = change(queue);
      return Promise.resolve(queue);
    },
  };
}

const nothing = (): Promise<void> => Promise.resolve();

describe("sending what waits", () => {
  it("sends in order, once each, and ends with an empty queue", async () => {
    const store = memoryStore([logOf("a", "1"), logOf("b", "2", "lift-2")]);
    const keys: string[] = [];
    const send = (entry: Entry): Promise<Outcome> => {
      keys.push(entry.key);
      return Promise.resolve({ is: "sent", version: 1 });
    };
    expect(await flush(store, { send, onSent: nothing, onStale: nothing })).toBe("done");
    expect(keys).toEqual(["a", "b"]);
    expect(store.read()).toEqual([]);
  });

  it("stops at the first write that gets no answer, marked as tried, and repeats it with the same key", async () => {
    const store = memoryStore([logOf("a", "1"), logOf("b", "2", "lift-2")]);
    const keys: string[] = [];
    let reachable = false;
    const send = (entry: Entry): Promise<Outcome> => {
      keys.push(entry.key);
      return Promise.resolve(reachable ? { is: "sent", version: 1 } : { is: "unreachable" });
    };
    expect(await flush(store, { send, onSent: nothing, onStale: nothing })).toBe("unreachable");
    expect(store.read().map(({ tried }) => tried)).toEqual([true, false]);
    reachable = true;
    expect(await flush(store, { send, onSent: nothing, onStale: nothing })).toBe("done");
    expect(keys).toEqual(["a", "a", "b"]);
  });

  it("keeps everything when the session has ended", async () => {
    const store = memoryStore([logOf("a", "1")]);
    const send = (): Promise<Outcome> => Promise.resolve({ is: "signed-out" });
    expect(await flush(store, { send, onSent: nothing, onStale: nothing })).toBe("signed-out");
    expect(store.read()).toHaveLength(1);
  });

  it("goes on past a write that needs a person", async () => {
    const store = memoryStore([logOf("a", "1"), logOf("b", "2", "lift-2")]);
    const send = (entry: Entry): Promise<Outcome> =>
      Promise.resolve(
        entry.key === "a"
          ? { is: "stuck", stuck: { why: "refused", text: "Too late.", errors: [] } }
          : { is: "sent", version: 1 },
      );
    expect(await flush(store, { send, onSent: nothing, onStale: nothing })).toBe("done");
    expect(store.read().map(({ key, stuck }) => [key, stuck?.why])).toEqual([["a", "refused"]]);
  });

  it("shows what a stale write was changed to before it is put aside", async () => {
    const store = memoryStore([logOf("a", "mine")]);
    const theirs = { ...EMPTY_LOG, note: "theirs", version: 4, loggedAt: "", changedAt: "" };
    const shown: [string, number][] = [];
    await flush(store, {
      send: () => Promise.resolve({ is: "stuck", stuck: { why: "stale", theirs } }),
      onSent: nothing,
      onStale: (entry, { version }) => {
        expect(store.read()[0]?.stuck).toBeNull();
        shown.push([entry.key, version]);
        return nothing();
      },
    });
    expect(shown).toEqual([["a", 4]]);
    expect(store.read()[0]?.stuck?.why).toBe("stale");
  });

  it("sends what is written while it sends, on top of the version that was just given", async () => {
    const store = memoryStore([logOf("a", "1")]);
    const seen: [string, number][] = [];
    const send = async (entry: Entry): Promise<Outcome> => {
      if (entry.work.kind !== "log") throw new Error("Only logs here.");
      seen.push([entry.key, entry.work.baseVersion]);
      if (entry.key === "a") await store.change((queue) => enqueue(queue, logOf("b", "2")));
      return { is: "sent", version: entry.work.baseVersion + 1 };
    };
    await flush(store, { send, onSent: nothing, onStale: nothing });
    expect(seen).toEqual([
      ["a", 0],
      ["b", 1],
    ]);
    expect(store.read()).toEqual([]);
  });
});
