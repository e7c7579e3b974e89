// Plain Node, no dependency: installs Debian's packages where this process may.
import { existsSync, mkdirSync, rmSync, writeFileSync } from "node:fs";
import { explain, run, SetupError } from "./command.mjs";

export const isRoot = () => process.getuid?.() === 0;

const APT_ENV = { ...process.env, DEBIAN_FRONTEND: "noninteractive", LC_ALL: "C.UTF-8" };
// Another apt (unattended upgrades, a second clone) may hold the lock for a while.
const APT = ["-o", "DPkg::Lock::Timeout=300", "-q", "-y"];
const MAIN_CLUSTER_CONF = "/etc/postgresql-common/createcluster.d/00-bellward-no-main.conf";

/**
 * Installs Debian packages. Ordinary users and other systems get one line saying what is missing.
 * @param {readonly string[]} packages
 * @param {string} what for whom it is, as in "PostgreSQL"
 * @param {(line: string) => void} log
 */
export async function installPackages(packages, what, log) {
  const line = `apt-get install ${packages.join(" ")}`;
  if (!existsSync("/usr/bin/apt-get"))
    throw new SetupError(`${what} is not installed; install it and start again (on Debian: ${line})`);
  if (!isRoot()) throw new SetupError(`${what} is not installed; as root: ${line}`);
  // Debian's own cluster would take 5432 and start at once. The switch is removed again: it is the machine's, not ours.
  const noMain = packages.includes("postgresql") && !existsSync(MAIN_CLUSTER_CONF);
  if (noMain) {
    mkdirSync("/etc/postgresql-common/createcluster.d", { recursive: true });
    writeFileSync(MAIN_CLUSTER_CONF, "create_main_cluster = false\n");
  }
  try {
    log(`${what}: reading Debian's package lists`);
    const update = await run("apt-get", [...APT, "update"], { env: APT_ENV, unbroken: true });
    log(`${what}: ${line}`);
    const install = await run("apt-get", [...APT, "install", "--no-install-recommends", ...packages], {
      env: APT_ENV,
      unbroken: true,
      onLine: (text) => {
        if (/^(Need to get|Unpacking|Setting up)/.test(text)) log(`  ${text.slice(0, 90)}`);
      },
    });
    if (install.code !== 0) {
      const reason = explain(`${update.code === 0 ? "" : update.stderr}\n${install.stderr}`);
      throw new SetupError(`${what} could not be installed (${line}): ${reason}`);
    }
  } finally {
    if (noMain) rmSync(MAIN_CLUSTER_CONF, { force: true });
  }
}
