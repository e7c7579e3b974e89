// Plain Node, no dependency: the processes that make a running Bellward, beside its database.
import { spawn } from "node:child_process";
import { mkdirSync } from "node:fs";
import { request } from "node:http";
import { setTimeout as pause } from "node:timers/promises";
import { NEXT } from "./build.mjs";
import { killGroup, SetupError } from "./command.mjs";
import { ROOT } from "./project.mjs";

// The server finishes the mail it is sending before it ends.
const PATIENCE_MS = 15_000;
const READY_MS = 90_000;

/** @typedef {{ what: string; pid?: number; ended: Promise<number> }} Child */

/** A child of ours with its own process group. `ended` resolves with its exit code. */
function startChild(what, args, env, stdout) {
  const child = spawn(process.execPath, args, {
    cwd: ROOT,
    env: { ...process.env, ...env },
    detached: true,
    stdio: ["ignore", stdout, "inherit"],
  });
  const ended = new Promise((resolve) => {
    child.once("exit", (code, signal) => resolve(code ?? (signal ? 128 : 1)));
    child.once("error", () => resolve(127));
  });
  return { what, child, pid: child.pid, ended };
}

/**
 * Ends a child: asks first, then insists.
 * @param {Child} child
 */
export async function endChild({ pid, ended }) {
  killGroup(pid, "SIGTERM");
  const late = pause(PATIENCE_MS, "late", { ref: false });
  if ((await Promise.race([ended, late])) === "late") {
    killGroup(pid, "SIGKILL");
    await ended;
  }
}

/**
 * Starts the mail catcher on a free port of loopback.
 * @param {string} dir where each mail becomes a file
 * @param {(child: Child) => void} [onStart]
 */
export async function startCatcher(dir, onStart) {
  mkdirSync(dir, { recursive: true });
  const catcher = startChild(
    "mail catcher",
    ["lib/mail/catcher.mjs"],
    { CATCHER_DIR: dir, CATCHER_PORT: "0" },
    "pipe",
  );
  onStart?.(catcher);
  const said = new Promise((resolve) => {
    let text = "";
    catcher.child.stdout.setEncoding("utf8");
    catcher.child.stdout.on("data", (chunk) => {
      text += chunk;
      if (text.includes("\n")) resolve(text);
    });
  });
  const first = await Promise.race([said, catcher.ended]);
  if (typeof first === "number") throw new SetupError("the mail catcher does not start");
  const { port } = JSON.parse(first);
  return { ...catcher, smtpUrl: `smtp://127.0.0.1:${port}` };
}

/** Status of one GET, or null while nobody answers. */
function statusOf(url) {
  return new Promise((resolve) => {
    const asked = request(url, { timeout: 30_000 }, (answer) => {
      answer.resume();
      resolve(answer.statusCode ?? null);
    });
    asked.on("timeout", () => asked.destroy());
    asked.on("error", () => resolve(null));
    asked.end();
  });
}

/**
 * Starts the server and waits until it answers.
 * @param {{ port: number; env: Record<string, string>; dev?: boolean; log?: "inherit" | "ignore" | number;
 *   onStart?: (child: Child) => void }} options
 *   `onStart` gets the process before it answers, so that a stop in between ends it
 */
export async function startServer({ port, env, dev = false, log = "inherit", onStart }) {
  const args = [NEXT, dev ? "dev" : "start", "--hostname", "127.0.0.1", "--port", String(port)];
  const settings = {
    NODE_ENV: dev ? "development" : "production",
    NEXT_TELEMETRY_DISABLED: "1",
    // Next's own handler would end the process in the middle of a mail; instrumentation.ts ends it in order.
    NEXT_MANUAL_SIG_HANDLE: "true",
    PORT: String(port),
  };
  const server = startChild("server", args, { ...env, ...settings }, log);
  onStart?.(server);
  const until = Date.now() + READY_MS;
  const health = `http://127.0.0.1:${port}/api/health`;
  let over = null;
  void server.ended.then((code) => (over = code));
  for (;;) {
    const status = await statusOf(health);
    if (over !== null)
      throw new SetupError(`the server ended while starting (exit code ${over}); its reason stands above`);
    if (status === 200) return server;
    if (status !== null && status !== 503) {
      await endChild(server);
      throw new SetupError(`the server is not well: GET /api/health answers ${status}`);
    }
    if (Date.now() > until) {
      await endChild(server);
      throw new SetupError(
        status === null
          ? "the server does not answer"
          : "the server is not well: GET /api/health answers 503",
      );
    }
    await pause(100);
  }
}
