import { dequal } from "dequal/lite";
import type { LogView, SessionLog } from "@/lib/schemas/today";
import { placeOf, type Entry, type Stuck } from "./entry";

/** What waits on this phone, in the order in which it was written. Values only: `queue-store.ts` keeps them. */
export type Queue = readonly Entry[];

const samePlace = (a: Entry, b: Entry): boolean => placeOf(a.work) === placeOf(b.work);

const put = (queue: Queue, key: string, change: (entry: Entry) => Entry): Queue =>
  queue.map((entry) => (entry.key === key ? change(entry) : entry));

/** The same write on top of `base`. */
const onBase = (entry: Entry, base: number): Entry =>
  entry.work.kind === "log" ? { ...entry, work: { ...entry.work, baseVersion: base } } : entry;

const baseOf = ({ work }: Entry): number | null => (work.kind === "log" ? work.baseVersion : null);

/** `fresh` on the base of `before`, which it takes the place of or follows: both edited the same version. */
function after(before: Entry, fresh: Entry): Entry {
  const base = baseOf(before);
  return base === null ? fresh : onBase(fresh, base);
}

/**
 * Adds a write. One that waits at the same place is replaced and its base kept; one that was already sent stays in front,
 * because it may have arrived. A conflict that nobody has settled stays one, with the newer words on our side.
 */
export function enqueue(queue: Queue, fresh: Entry): Queue {
  const before = queue.findLast((entry) => samePlace(entry, fresh));
  if (!before) return [...queue, fresh];
  const next = after(before, fresh);
  if (before.tried) return [...queue, next];
  const stuck = before.stuck?.why === "stale" ? before.stuck : null;
  return queue.map((entry) => (entry === before ? { ...next, stuck } : entry));
}

/** The next write to send: what is stuck waits for a person, the rest goes on. */
export const nextToSend = (queue: Queue): Entry | null => queue.find(({ stuck }) => stuck === null) ?? null;

/** To be stored before sending, so that a page that dies meanwhile knows that the write may have arrived. */
export const trying = (queue: Queue, key: string): Queue =>
  put(queue, key, (entry) => ({ ...entry, tried: true }));

/** The server took it; `version` is what the log now has, null for what has none. Writes behind it build on that. */
export function sent(queue: Queue, key: string, version: number | null): Queue {
  const done = queue.find((entry) => entry.key === key);
  if (!done) return queue;
  return queue
    .filter((entry) => entry !== done)
    .map((entry) => (version !== null && samePlace(entry, done) ? onBase(entry, version) : entry));
}

const FIELDS = [
  "state",
  "effort",
  "minutes",
  "hardRounds",
  "knock",
  "painPlace",
  "pain",
  "note",
] as const satisfies readonly (keyof SessionLog)[];

const bySet = (a: SessionLog["sets"][number], b: SessionLog["sets"][number]): number =>
  a.slot.localeCompare(b.slot) || a.number - b.number;

/** Whether two logs say the same; the order of sets says nothing. */
export const sameLog = (a: SessionLog, b: SessionLog): boolean =>
  FIELDS.every((field) => a[field] === b[field]) && dequal([...a.sets].sort(bySet), [...b.sets].sort(bySet));

/** The server refused it: a later write to the same place stands in for it, otherwise a person decides. */
export function refused(queue: Queue, key: string, stuck: Stuck): Queue {
  const failed = queue.find((entry) => entry.key === key);
  if (!failed) return queue;
  const later = queue.findLast((entry) => entry !== failed && samePlace(entry, failed));
  const rest = later ? queue.filter((entry) => entry !== failed) : queue;
  const { key: at, work } = later ?? failed;
  if (stuck.why === "stale" && work.kind === "log" && sameLog(work.log, stuck.theirs))
    return sent(rest, at, stuck.theirs.version);
  // A later write that was not refused itself is simply sent; the same base would be as stale.
  if (later && stuck.why === "refused") return rest;
  return put(rest, at, (entry) => ({ ...entry, tried: false, stuck }));
}

/** Settles a conflict for what this phone says. A knock that either side reported stays: only the medic lifts it. */
export const keepMine = (queue: Queue, key: string, freshKey: string): Queue =>
  put(queue, key, (entry) => {
    if (entry.stuck?.why !== "stale" || entry.work.kind !== "log") return entry;
    const { theirs } = entry.stuck;
    const log = { ...entry.work.log, knock: entry.work.log.knock || theirs.knock };
    const work = { ...entry.work, baseVersion: theirs.version, log };
    return { ...entry, key: freshKey, work, stuck: null };
  });

/** Sends a refused write once more. */
export const again = (queue: Queue, key: string, freshKey: string): Queue =>
  put(queue, key, (entry) => (entry.stuck ? { ...entry, key: freshKey, stuck: null } : entry));

/** Takes a write out: theirs is kept, or it was thrown away by its author. */
export const drop = (queue: Queue, key: string): Queue => queue.filter((entry) => entry.key !== key);

/** The newest log of a session that waits. */
export function waitingLog(queue: Queue, campId: string, sessionId: string): SessionLog | null {
  const work = queue.findLast(
    (entry) =>
      entry.work.kind === "log" && entry.work.campId === campId && entry.work.sessionId === sessionId,
  )?.work;
  return work?.kind === "log" ? work.log : null;
}

/** How many writes wait for the net or for a person. */
export const countOf = (
  queue: Queue,
): { readonly waiting: number; readonly stale: number; readonly refused: number } => ({
  waiting: queue.filter(({ stuck }) => stuck === null).length,
  stale: queue.filter(({ stuck }) => stuck?.why === "stale").length,
  refused: queue.filter(({ stuck }) => stuck?.why === "refused").length,
});

/** A log without what the server adds. */
export const contentOf = ({ version: _v, loggedAt: _l, changedAt: _c, ...log }: LogView): SessionLog => log;
