// Plain Node, no dependency: runs before anything is installed.
import { spawn } from "node:child_process";
import { statfsSync } from "node:fs";

/** A failure whose message is the one line a person needs; anything else is a defect and keeps its stack. */
export class SetupError extends Error {
  name = "SetupError";
}

/** Commands that are running, with whether they may be broken off. */
const running = new Map();

/**
 * Runs a command to its end and gives what it printed. Never throws on a non-zero exit: the caller knows what it means.
 * Each has a process group of its own, so that Ctrl-C in a terminal reaches only us and we end things in order.
 * @param {string} command
 * @param {readonly string[]} args
 * @param {import("node:child_process").SpawnOptions & {
 *   input?: string; onLine?: (line: string) => void; unbroken?: boolean; timeoutMs?: number }} [options]
 *   `unbroken`: a stop waits for it (dpkg half-way is worse than late)
 * @returns {Promise<{ code: number; stdout: string; stderr: string; output: string; timedOut: boolean }>}
 */
export function run(command, args, { input, onLine, unbroken = false, timeoutMs, ...options } = {}) {
  return new Promise((resolve) => {
    const child = spawn(command, args, { stdio: ["pipe", "pipe", "pipe"], detached: true, ...options });
    let timedOut = false;
    const timer =
      timeoutMs && setTimeout(() => ((timedOut = true), killGroup(child.pid, "SIGKILL")), timeoutMs);
    const finish = (code) => {
      clearTimeout(timer);
      running.delete(child);
      resolve({ code, stdout, stderr, output, timedOut });
    };
    running.set(child, { unbroken, ended: new Promise((done) => child.once("close", done)) });
    let stdout = "";
    let stderr = "";
    let output = "";
    const collect = (stream, add) => {
      if (!stream) return;
      let rest = "";
      stream.setEncoding("utf8");
      stream.on("data", (chunk) => {
        add(chunk);
        output += chunk;
        if (!onLine) return;
        const lines = (rest + chunk).split("\n");
        rest = lines.pop() ?? "";
        for (const line of lines) onLine(line);
      });
    };
    collect(child.stdout, (chunk) => (stdout += chunk));
    collect(child.stderr, (chunk) => (stderr += chunk));
    child.on("error", (error) => {
      stderr += error.message;
      output += error.message;
      finish(127);
    });
    child.on("close", (code, signal) => finish(code ?? (signal ? 128 : 1)));
    // A child that ends before it reads its input closes the pipe: its exit code tells, not EPIPE.
    child.stdin?.on("error", () => undefined);
    child.stdin?.end(input ?? "");
  });
}

/** Signals a process and everything it started. */
export function killGroup(pid, signal) {
  if (!pid) return;
  try {
    process.kill(-pid, signal);
  } catch (error) {
    if (error.code !== "ESRCH") throw error;
  }
}

/** Ends the commands that `run` still has going; waits for those that must not be broken off. */
export async function endRunning() {
  const all = [...running];
  for (const [child, { unbroken }] of all) if (!unbroken) killGroup(child.pid, "SIGTERM");
  await Promise.all(all.map(([, { ended }]) => ended));
}

const FULL_BELOW_BYTES = 1_000_000;

function isFull(folder) {
  const { bavail, bsize } = statfsSync(folder);
  return bavail * bsize < FULL_BELOW_BYTES;
}

/**
 * Turns what the system said into one line a person can act on.
 * @param {string} text
 * @param {string} [folder] where it wrote: some programs fail on a full disk without saying so
 */
export function explain(text, folder) {
  if (folder && isFull(folder)) return "the disk is full; free some space and start again";
  if (/No space left on device|ENOSPC|Disk quota exceeded|EDQUOT/i.test(text))
    return "the disk is full; free some space and start again";
  if (/Read-only file system|EROFS/i.test(text)) return "the disk is read-only here";
  if (/Permission denied|EACCES|EPERM|Operation not permitted/i.test(text)) {
    const path = /(?:"|')(\/[^"']+)(?:"|')/.exec(text)?.[1];
    return `no permission${path ? ` for ${path}` : ""}`;
  }
  const lines = text
    .split("\n")
    .map((line) => line.trim())
    .filter(Boolean);
  const telling =
    lines.findLast((line) => /FATAL|PANIC|ERROR|error/.test(line)) ?? lines.at(-1) ?? "no reason given";
  return telling.replace(/^[\d-]+ [\d:.]+ \S+ (\[\d+\] )?/, "");
}

/** Runs `main`, prints a `SetupError` or a full disk as one line, and sets the exit code. */
export async function runMain(main) {
  try {
    process.exitCode = (await main()) ?? 0;
  } catch (error) {
    process.exitCode = 1;
    if (error instanceof SetupError) console.error(`bellward: ${error.message}`);
    else if (error instanceof Error && "code" in error && "syscall" in error)
      console.error(`bellward: ${explain(error.message)}`);
    else console.error(error);
  }
}
