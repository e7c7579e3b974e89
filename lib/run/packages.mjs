// Plain Node, no dependency: brings node_modules to what the lock file says.
import { existsSync, readFileSync } from "node:fs";
import { explain, run, SetupError } from "./command.mjs";
import { step } from "./progress.mjs";
import { inRoot, ROOT } from "./project.mjs";

const packagesOf = (file) =>
  Object.entries(JSON.parse(readFileSync(file, "utf8")).packages ?? {}).filter(([place]) => place !== "");

/** Whether node_modules holds what package-lock.json asks for. npm writes its own copy of the lock last, when all is there. */
export function packagesAreCurrent() {
  const installed = inRoot("node_modules", ".package-lock.json");
  if (!existsSync(installed)) return false;
  const there = new Map(packagesOf(installed));
  return packagesOf(inRoot("package-lock.json")).every(([place, wanted]) => {
    const found = there.get(place);
    // Optional ones are for other processors and systems.
    if (!found) return wanted.optional === true || wanted.devOptional === true || wanted.peer === true;
    return found.version === wanted.version && found.integrity === wanted.integrity;
  });
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
