// `npm run build`: a production build, unless the one that is there was made from these very sources. `--force` builds anyway.
import { createHash } from "node:crypto";
import { existsSync, readdirSync, readFileSync, rmSync } from "node:fs";
import { fileURLToPath } from "node:url";
import { withLock } from "../../db/server-ports.mjs";
import { explain, run, runMain, SetupError } from "./command.mjs";
import { ensurePackages } from "./packages.mjs";
import { say, step } from "./progress.mjs";
import { checkNode, inData, inRoot, makeDataFolder, ROOT, writeWhole } from "./project.mjs";

export const NEXT = "node_modules/next/dist/bin/next";
const STAMP = inData("build-stamp");
const FOLDERS = ["app", "components", "lib", "db", "drizzle", "public"];
// Not tsconfig.json: Next itself rewrites it while it builds.
const FILES = [
  "package.json",
  "package-lock.json",
  "next.config.mjs",
  "tailwind.config.ts",
  "postcss.config.mjs",
  "instrumentation.ts",
  "proxy.ts",
];
const WORKER = "public/sw.js";
// Run beside the server and no part of it, or made by the build itself.
const OUTSIDE = ["lib/run", "db/seed", WORKER];

function* filesIn(folder) {
  if (OUTSIDE.includes(folder) || !existsSync(inRoot(folder))) return;
  for (const entry of readdirSync(inRoot(folder), { withFileTypes: true }).sort((a, b) =>
    a.name < b.name ? -1 : 1,
  )) {
    const name = `${folder}/${entry.name}`;
    if (entry.isDirectory()) yield* filesIn(name);
    else if (!OUTSIDE.includes(name)) yield name;
  }
}

/** Names this build: sources, lock file, Node, the settings that are baked in, and the place (a build knows its folder). */
export function sourceHash() {
  const hash = createHash("sha256").update(`${ROOT}\0${process.versions.node}\0`);
  for (const [key, value] of Object.entries(process.env).sort())
    if (key.startsWith("NEXT_PUBLIC_")) hash.update(`${key}=${value}\0`);
  const files = [
    ...FOLDERS.flatMap((folder) => [...filesIn(folder)]),
    ...FILES.filter((file) => existsSync(inRoot(file))),
  ];
  for (const file of files)
    hash
      .update(`${file}\0`)
      .update(readFileSync(inRoot(file)))
      .update("\0");
  return hash.digest("hex");
}

const isBuilt = (hash) =>
  existsSync(inRoot(".next", "BUILD_ID")) &&
  existsSync(inRoot(WORKER)) &&
  existsSync(STAMP) &&
  readFileSync(STAMP, "utf8").trim() === hash;

/** The service worker of the athlete's phone: one file under a fixed name, since its address is its identity. */
async function buildWorker() {
  const { build } = await import("esbuild");
  await build({
    absWorkingDir: ROOT,
    entryPoints: ["lib/offline/service-worker.ts"],
    outfile: inRoot(WORKER),
    bundle: true,
    minify: true,
    format: "iife",
    target: "es2022",
    legalComments: "none",
    define: { "process.env.NODE_ENV": '"production"' },
    logLevel: "error",
  });
}

/**
 * Builds when the sources changed since the last build.
 * @returns {Promise<boolean>} whether it built
 */
export async function ensureBuild({ force = false } = {}) {
  return withLock(inData("build.lock"), async () => {
    const hash = sourceHash();
    if (!force && isBuilt(hash)) return false;
    rmSync(STAMP, { force: true });
    await step("Building", async () => {
      await buildWorker();
      const built = await run(process.execPath, [NEXT, "build"], {
        cwd: ROOT,
        env: { ...process.env, NODE_ENV: "production", NEXT_TELEMETRY_DISABLED: "1" },
      });
      if (built.code === 0) return;
      if (/ENOSPC|No space left|EACCES|EROFS/.test(built.output))
        throw new SetupError(`the build failed: ${explain(built.output)}`);
      say(built.output);
      throw new SetupError("the build failed; the reason stands above");
    });
    writeWhole(STAMP, `${hash}\n`);
    return true;
  });
}

if (process.argv[1] === fileURLToPath(import.meta.url)) {
  await runMain(async () => {
    checkNode();
    makeDataFolder();
    await ensurePackages();
    if (!(await ensureBuild({ force: process.argv.includes("--force") }))) say("The build is up to date.");
  });
}
