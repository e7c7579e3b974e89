// Ports, processes and the lock that keeps two starters of one cluster apart. Plain Node, no dependency.
import { randomInt, randomUUID } from "node:crypto";
import { existsSync, linkSync, readFileSync, rmSync, writeFileSync } from "node:fs";
import { createServer } from "node:net";
import { setTimeout as pause } from "node:timers/promises";
import { SetupError } from "../lib/run/command.mjs";

/** Whether nobody listens on `port` of 127.0.0.1. */
export function portIsFree(port) {
  return new Promise((resolve) => {
    const probe = createServer();
    probe.once("error", () => resolve(false));
    probe.listen({ port, host: "127.0.0.1", exclusive: true }, () => probe.close(() => resolve(true)));
  });
}

/** A free port below the kernel's range for outgoing connections, so that it is likely still free at the next start. */
export async function freePort() {
  for (let attempt = 0; attempt < 50; attempt += 1) {
    const port = randomInt(20_000, 30_000);
    if (await portIsFree(port)) return port;
  }
  throw new SetupError("no free port between 20000 and 30000 on 127.0.0.1");
}

/** Whether the process lives. Where nothing reaps orphans a dead one stays as a zombie, and signal 0 still reaches it. */
export function isAlive(pid) {
  if (!Number.isInteger(pid) || pid <= 0 || !existsSync(`/proc/${pid}/stat`)) return false;
  try {
    const stat = readFileSync(`/proc/${pid}/stat`, "utf8");
    return !/^[ZX]/.test(stat.slice(stat.lastIndexOf(")") + 2));
  } catch {
    return false;
  }
}

const LOCK_PATIENCE_MS = 180_000;

/**
 * Runs `work` while holding a lock file that names this process; a dead holder's lock is taken over.
 * @template T
 * @param {string} file
 * @param {() => Promise<T>} work
 * @returns {Promise<T>}
 */
export async function withLock(file, work) {
  const mine = `${file}.${randomUUID()}`;
  const until = Date.now() + LOCK_PATIENCE_MS;
  writeFileSync(mine, String(process.pid), { mode: 0o600 });
  try {
    // A link appears with its content: nobody ever reads a lock that names nobody.
    while (!tryLink(mine, file)) {
      const holder = readIfThere(file);
      if (holder !== null && !isAlive(Number(holder))) rmSync(file, { force: true });
      else if (Date.now() > until)
        throw new SetupError(
          `process ${holder} has held ${file} for three minutes; end it or remove the file`,
        );
      else await pause(50);
    }
    try {
      return await work();
    } finally {
      rmSync(file, { force: true });
    }
  } finally {
    rmSync(mine, { force: true });
  }
}

function tryLink(from, to) {
  try {
    linkSync(from, to);
    return true;
  } catch (error) {
    if (error.code === "EEXIST") return false;
    throw error;
  }
}

function readIfThere(file) {
  try {
    return readFileSync(file, "utf8");
  } catch {
    return null;
  }
}
