// Where PostgreSQL's programs and data lie, and as whom they run. Plain Node, no dependency.
import { createHash } from "node:crypto";
import { chownSync, existsSync, readdirSync } from "node:fs";
import path from "node:path";
import { run, SetupError } from "../lib/run/command.mjs";
import { installPackages, isRoot } from "../lib/run/debian.mjs";

// Debian keeps server programs off PATH, one folder a major version.
const DEBIAN_ROOT = "/usr/lib/postgresql";
const hasServer = (bin) =>
  existsSync(`${bin}/initdb`) && existsSync(`${bin}/pg_ctl`) && existsSync(`${bin}/postgres`);

function candidates() {
  const debian = existsSync(DEBIAN_ROOT)
    ? readdirSync(DEBIAN_ROOT)
        .filter((name) => /^\d+$/.test(name))
        .sort((a, b) => Number(b) - Number(a))
        .map((name) => `${DEBIAN_ROOT}/${name}/bin`)
    : [];
  return [...debian, ...(process.env.PATH ?? "").split(":")].filter((bin) => bin !== "" && hasServer(bin));
}

/**
 * Folder with `initdb`, `pg_ctl` and `psql`; installs Debian's PostgreSQL when there is none.
 * A cluster opens only with its own major version: give `version` for one that exists.
 */
export async function binFolder(log, version) {
  if (candidates().length === 0) await installPackages(["postgresql"], "PostgreSQL", log);
  for (const bin of candidates()) {
    if (version === undefined) return bin;
    if ((await run(`${bin}/postgres`, ["--version"])).stdout.includes(` ${version}.`)) return bin;
  }
  throw new SetupError(
    version === undefined
      ? "PostgreSQL is installed, but its server programs (initdb, pg_ctl) are nowhere to be found"
      : `the local database was made by PostgreSQL ${version}, which is no longer installed (apt-get install postgresql-${version})`,
  );
}

/** Runs a server program: PostgreSQL refuses root, so root becomes Debian's `postgres` user. */
export function asServerUser(command, args) {
  // cwd: the postgres user may not be able to enter ours, which some programs complain about.
  const options = { cwd: "/", env: { PATH: process.env.PATH, LC_ALL: "C.UTF-8" }, unbroken: true };
  if (!isRoot()) return run(command, args, options);
  return run(
    "setpriv",
    ["--reuid=postgres", "--regid=postgres", "--init-groups", "--", command, ...args],
    options,
  );
}

let serverUser;
async function serverUserIds() {
  if (!serverUser) {
    const [uid, gid] = await Promise.all([run("id", ["-u", "postgres"]), run("id", ["-g", "postgres"])]);
    if (uid.code !== 0)
      throw new SetupError("PostgreSQL refuses to run as root and there is no user `postgres`");
    serverUser = { uid: Number(uid.stdout), gid: Number(gid.stdout) };
  }
  return serverUser;
}

/** Makes a file or folder the server user's own. */
export async function giveToServerUser(file) {
  if (!isRoot()) return;
  const { uid, gid } = await serverUserIds();
  chownSync(file, uid, gid);
}

/** Whether the server user cannot get into `dir`, as in a checkout under /root. */
export async function mustLieElsewhere(dir) {
  return isRoot() && (await asServerUser("test", ["-x", dir])).code !== 0;
}

/** Folder of the data: under `dir`, or in Debian's place for such data, told apart by the path of `dir`. */
export function dataFolder(dir, elsewhere) {
  if (!elsewhere) return path.join(dir, "data");
  return `/var/lib/postgresql/bellward-${createHash("sha256").update(dir).digest("hex").slice(0, 12)}`;
}
