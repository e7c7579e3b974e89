import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { wireOf, type Entry, type Work } from "@/lib/offline/entry";
import { EMPTY_LOG } from "@/lib/offline/overlay";
import {
  again,
  drop,
  enqueue,
  keepMine,
  nextToSend,
  refused,
  sameLog,
  sent,
  trying,
  waitingLog,
  type Queue,
} from "@/lib/offline/queue";
import type { LogView, SessionLog } from "@/lib/schemas/today";

let count = 0;
const key = (): string => `00000000-0000-4000-8000-${String(++count).padStart(12, "0")}`;

const entry = (work: Work, over: Partial<Entry> = {}): Entry => ({
  key: key(),
  madeAt: "2026-12-02T10:00:00.000Z",
  title: "Strength A, Wed 2 Dec",
  work,
  tried: false,
  stuck: null,
  ...over,
});

const logOf = (note: string, baseVersion = 0, sessionId = "lift-1"): Entry =>
  entry({ kind: "log", campId: "camp", sessionId, baseVersion, log: { ...EMPTY_LOG, note } });

const theirs = (over: Partial<LogView> = {}): LogView => ({
  ...EMPTY_LOG,
  version: 5,
  loggedAt: "2026-12-02T09:00:00.000Z",
  changedAt: "2026-12-02T09:30:00.000Z",
  ...over,
});

const bases = (queue: Queue): number[] =>
  queue.flatMap(({ work }) => (work.kind === "log" ? [work.baseVersion] : []));
const notes = (queue: Queue): string[] =>
  queue.flatMap(({ work }) => (work.kind === "log" ? [work.log.note] : []));

describe("a queue of writes on a phone", () => {
  it("replaces a log that waits by the newer one and keeps the version that was edited", () => {
    const queue = enqueue(enqueue([], logOf("first", 3)), logOf("second", 7));
    expect(notes(queue)).toEqual(["second"]);
    expect(bases(queue)).toEqual([3]);
  });

  it("keeps other sessions, check-ins and weights apart, in the order in which they were written", () => {
    const checkIn = entry({
      kind: "check-in",
      athleteId: "a",
      date: "2026-12-02",
      answers: { sleep: 2, fatigue: 3, soreness: 4, stress: 1 },
    });
    const weight = entry({ kind: "weight", athleteId: "a", date: "2026-12-02", kg: 62.9 });
    const queue = [logOf("a"), checkIn, weight, logOf("b", 0, "lift-2")].reduce<Queue>(enqueue, []);
    expect(queue.map(({ work }) => work.kind)).toEqual(["log", "check-in", "weight", "log"]);
  });

  it("never replaces a write that may have arrived: the newer one waits behind it and builds on its version", () => {
    const first = logOf("first");
    let queue: Queue = trying([first], first.key);
    queue = enqueue(queue, logOf("second"));
    expect(notes(queue)).toEqual(["first", "second"]);
    expect(nextToSend(queue)?.key).toBe(first.key);
    queue = sent(queue, first.key, 1);
    expect(notes(queue)).toEqual(["second"]);
    expect(bases(queue)).toEqual([1]);
  });

  it("puts a stale write aside with both versions, and goes on with the rest", () => {
    const mine = logOf("mine", 3);
    const other = logOf("other", 0, "lift-2");
    const queue = refused([mine, other], mine.key, { why: "stale", theirs: theirs({ note: "theirs" }) });
    expect(queue).toHaveLength(2);
    expect(queue[0]?.stuck).toMatchObject({ why: "stale", theirs: { note: "theirs" } });
    expect(nextToSend(queue)?.key).toBe(other.key);
  });

  it("keeps mine on top of theirs under a fresh key, and a knock that the other side reported", () => {
    const mine = logOf("mine", 3);
    const stuck = refused([mine], mine.key, { why: "stale", theirs: theirs({ knock: true }) });
    const fresh = key();
    const [kept] = keepMine(stuck, mine.key, fresh);
    expect(kept).toMatchObject({
      key: fresh,
      stuck: null,
      work: { baseVersion: 5, log: { note: "mine", knock: true } },
    });
  });

  it("takes theirs by dropping mine, and nothing else", () => {
    const mine = logOf("mine");
    const other = logOf("other", 0, "lift-2");
    expect(drop([mine, other], mine.key)).toEqual([other]);
  });

  it("sees no conflict where both say the same, in whatever order the sets stand", () => {
    const set = (number: number) => ({
      slot: "main",
      number,
      exerciseId: "x",
      kg: 105,
      reps: 4,
      reserve: null,
    });
    const log: SessionLog = { ...EMPTY_LOG, sets: [set(2), set(1)] };
    const mine = entry({ kind: "log", campId: "camp", sessionId: "lift-1", baseVersion: 0, log });
    const stuck = { why: "stale", theirs: theirs({ sets: [set(1), set(2)] }) } as const;
    expect(refused([mine], mine.key, stuck)).toEqual([]);
    expect(sameLog(log, { ...log, sets: [set(1)] })).toBe(false);
    expect(sameLog(log, { ...log, effort: 7 })).toBe(false);
  });

  it("lets a newer write stand in for one that was refused or stale", () => {
    const first = logOf("first", 2);
    const queue = enqueue(trying([first], first.key), logOf("second", 2));
    const bad = refused(queue, first.key, { why: "refused", text: "No.", errors: [] });
    expect(notes(bad)).toEqual(["second"]);
    expect(nextToSend(bad)).not.toBeNull();
    const stale = refused(queue, first.key, { why: "stale", theirs: theirs() });
    expect(notes(stale)).toEqual(["second"]);
    expect(stale[0]?.stuck?.why).toBe("stale");
  });

  it("keeps a refused write with its reason until it is sent again or written anew", () => {
    const mine = logOf("mine");
    const queue = refused(trying([mine], mine.key), mine.key, {
      why: "refused",
      text: "Too late.",
      errors: [],
    });
    expect(nextToSend(queue)).toBeNull();
    expect(queue[0]).toMatchObject({ tried: false, stuck: { why: "refused", text: "Too late." } });
    expect(nextToSend(again(queue, mine.key, key()))).not.toBeNull();
    expect(nextToSend(enqueue(queue, logOf("put right")))).toMatchObject({
      work: { log: { note: "put right" } },
    });
  });

  it("leaves a conflict open while one goes on editing, with the newer words on this side", () => {
    const mine = logOf("mine", 3);
    const stuck = refused([mine], mine.key, { why: "stale", theirs: theirs() });
    const queue = enqueue(stuck, logOf("mine, more", 5));
    expect(notes(queue)).toEqual(["mine, more"]);
    expect(bases(queue)).toEqual([3]);
    expect(nextToSend(queue)).toBeNull();
  });

  it("ends with the last words of every session and no write twice, whatever is lost on the way", () => {
    const step = fc.oneof(
      fc.record({ do: fc.constant("write" as const), session: fc.integer({ min: 1, max: 2 }) }),
      // The request never arrived, arrived and was answered, or arrived and its answer was lost.
      fc.record({ do: fc.constantFrom("no-net" as const, "answered" as const, "lost" as const) }),
    );
    fc.assert(
      fc.property(fc.array(step, { maxLength: 40 }), (steps) => {
        const server = new Map<string, { version: number; note: string; keys: string[] }>();
        const wrote = new Map<string, string>();
        let queue: Queue = [];
        let words = 0;
        const put = (one: Entry): number => {
          if (one.work.kind !== "log") throw new Error("Only logs here.");
          const { sessionId, baseVersion, log } = one.work;
          const known = server.get(sessionId) ?? { version: 0, note: "", keys: [] };
          if (known.keys.includes(one.key)) return known.version;
          // One device: what it builds on is always what the server has.
          expect(baseVersion).toBe(known.version);
          const version = known.version + 1;
          server.set(sessionId, { version, note: log.note, keys: [...known.keys, one.key] });
          return version;
        };
        const send = (how: "no-net" | "answered" | "lost"): void => {
          const next = nextToSend(queue);
          if (!next) return;
          queue = trying(queue, next.key);
          if (how === "no-net") return;
          const version = put(next);
          if (how === "answered") queue = sent(queue, next.key, version);
        };
        for (const one of steps) {
          if (one.do === "write") {
            const id = `lift-${one.session}`;
            const note = `words ${++words}`;
            wrote.set(id, note);
            queue = enqueue(queue, logOf(note, server.get(id)?.version ?? 0, id));
          } else send(one.do);
        }
        while (nextToSend(queue)) send("answered");
        expect(queue).toEqual([]);
        for (const [id, note] of wrote) expect(server.get(id)?.note).toBe(note);
      }),
      { seed: 20261202, numRuns: 500 },
    );
  });

  it("finds the newest log of a session that waits", () => {
    const first = logOf("first");
    const queue = enqueue(trying([first], first.key), logOf("second"));
    expect(waitingLog(queue, "camp", "lift-1")?.note).toBe("second");
    expect(waitingLog(queue, "camp", "lift-9")).toBeNull();
  });

  it("writes every kind to its address, with the key where the server asks for one", () => {
    const log = logOf("x");
    const request = entry({ kind: "request", campId: "c", sessionId: "s/1", reason: "Exam" });
    expect(wireOf(log)).toMatchObject({ method: "PUT", url: "/api/camps/camp/sessions/lift-1/log" });
    expect(wireOf(log).body).toMatchObject({ key: log.key, baseVersion: 0 });
    expect(wireOf(request)).toEqual({
      method: "POST",
      url: "/api/camps/c/sessions/s%2F1/request",
      body: { key: request.key, reason: "Exam" },
    });
    expect(wireOf(entry({ kind: "withdraw", campId: "c", sessionId: "s", requestId: "r" }))).toEqual({
      method: "POST",
      url: "/api/requests/r/withdraw",
      body: undefined,
    });
    expect(wireOf(entry({ kind: "weight", athleteId: "a", date: "2026-12-02", kg: 62.9 }))).toEqual({
      method: "PUT",
      url: "/api/athletes/a/weights/2026-12-02",
      body: { kg: 62.9 },
    });
  });
});
