// `npm run bench`: tests/bench/run.ts beside a production server on a seeded database that syncs to disk, as a real one does.
// The bench gets DATABASE_URL and, for what it asks over HTTP, BENCH_URL (no slash at its end).
import { spawn } from "node:child_process";
import { existsSync, mkdirSync, rmSync } from "node:fs";
import { psql, startCluster, stopCluster } from "../../db/server.mjs";
import { freePort } from "../../db/server-ports.mjs";
import { CHROMIUM, CHROMIUM_PACKAGES } from "./chromium.mjs";
import { endRunning, killGroup, runMain } from "./command.mjs";
import { installPackages } from "./debian.mjs";
import { ensurePackages } from "./packages.mjs";
import { say, step } from "./progress.mjs";
import { checkNode, inData, localSecret, makeDataFolder, ROOT } from "./project.mjs";

const DIR = inData("bench-pg");
const OUTBOX = inData("bench-outbox");
const undo = [];
let stopping = null;

function takeDown() {
  stopping ??= (async () => {
    await endRunning();
    for (const action of undo.reverse()) await action();
  })();
  return stopping;
}

async function emptyDatabase() {
  const { url } = await startCluster({ dir: DIR, log: say });
  undo.push(() => stopCluster({ dir: DIR }));
  await psql(DIR, "drop database if exists bellward with (force);\ncreate database bellward;", "postgres");
  return url;
}

const BUNDLE = inData("bench.mjs");

/** As one file: what runs TypeScript directly also names every function at each call, which is slower than what is measured. */
async function bundleBench() {
  const { build } = await import("esbuild");
  await build({
    absWorkingDir: ROOT,
    entryPoints: ["tests/bench/run.ts"],
    outfile: BUNDLE,
    bundle: true,
    packages: "external",
    platform: "node",
    format: "esm",
    target: "node20",
    logLevel: "error",
  });
}

function runBench(env) {
  return new Promise((resolve) => {
    const args = [BUNDLE, ...process.argv.slice(2)];
    const child = spawn(process.execPath, args, {
      cwd: ROOT,
      env: { ...process.env, ...env },
      detached: true,
      stdio: "inherit",
    });
    undo.push(() => killGroup(child.pid, "SIGTERM"));
    child.once("exit", (code) => resolve(code ?? 128));
  });
}

for (const signal of ["SIGINT", "SIGTERM"])
  process.on(signal, () => void takeDown().then(() => process.exit(1)));

await runMain(async () => {
  try {
    checkNode();
    makeDataFolder();
    await ensurePackages();
    if (!existsSync(CHROMIUM)) await installPackages(CHROMIUM_PACKAGES, "Chromium", say);
    const { ensureBuild } = await import("./build.mjs");
    const { migrateOrExplain, seedDemo } = await import("./database.mjs");
    const { endChild, startCatcher, startServer } = await import("./stack.mjs");
    await ensureBuild();
    const databaseUrl = await emptyDatabase();
    await migrateOrExplain(databaseUrl);
    await step("Laying out the demo", () => seedDemo(databaseUrl));
    const ended = (child) => undo.push(() => endChild(child));
    mkdirSync(OUTBOX, { recursive: true });
    undo.push(async () => rmSync(OUTBOX, { recursive: true, force: true }));
    const { smtpUrl } = await startCatcher(OUTBOX, ended);
    const port = await freePort();
    const url = `http://127.0.0.1:${port}`;
    const env = {
      DATABASE_URL: databaseUrl,
      SMTP_URL: smtpUrl,
      BELLWARD_OUTBOX_DIR: OUTBOX,
      MAIL_FROM: "Bellward <bellward@localhost>",
      NEXTAUTH_SECRET: localSecret(),
      NEXTAUTH_URL: url,
      APP_URL: url,
      LOG_LEVEL: "warn",
    };
    await startServer({ port, env, log: "ignore", onStart: ended });
    await bundleBench();
    return await runBench({ ...env, BENCH_URL: url });
  } finally {
    await takeDown();
  }
});
