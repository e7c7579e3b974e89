// Plain Node, no dependency: brings node_modules to what the lock file says.
import { existsSync, readFileSync } from "node:fs";
import { explain, run, SetupError } from "./command.mjs";
import { step } from "./progress.mjs";
import { inRoot, ROOT } from "./project.mjs";

const packagesOf = (file) => JSON.parse(readFileSync(file, "utf8")).packages ?? {};

/**
 * Whether what is installed differs from what the lock file wants; both as npm's `packages` by place.
 * @param {Record<string, { version?: string; integrity?: string; optional?: boolean; devOptional?: boolean; peer?: boolean }>} wanted
 * @param {Record<string, { version?: string; integrity?: string }>} installed
 */
export function packagesDiffer(wanted, installed) {
  return Object.entries(wanted).some(([place, asked]) => {
    if (place === "") return false;
    const found = installed[place];
    // Optional ones may be for other processors and systems.
    if (!found) return asked.optional !== true && asked.devOptional !== true && asked.peer !== true;
    return found.version !== asked.version || found.integrity !== asked.integrity;
  });
}

/** Whether node_modules holds what package-lock.json asks for. npm writes its own copy of the lock last, when all is there. */
export function packagesAreCurrent() {
  const installed = inRoot("node_modules", ".package-lock.json");
  if (!existsSync(installed)) return false;
  return !packagesDiffer(packagesOf(inRoot("package-lock.json")), packagesOf(installed));
}

/** Installs the packages of the lock file when they are missing or stale. */
export async function ensurePackages() {
  if (packagesAreCurrent()) return;
  await step("Installing packages (npm ci; a minute or two)", async () => {
    const npm = process.env.npm_execpath?.endsWith(".js")
      ? [process.execPath, process.env.npm_execpath]
      : ["npm"];
    const [command, ...first] = npm;
    const args = [...first, "ci", "--include=dev", "--no-audit", "--no-fund", "--loglevel=error"];
    const result = await run(command, args, { cwd: ROOT });
    if (result.code !== 0)
      throw new SetupError(`the packages could not be installed (npm ci): ${explain(result.output)}`);
  });
}
