import { mkdirSync, readdirSync, rmSync, writeFileSync } from "node:fs";
import path from "node:path";
import { clusterRuns, clusterUrl, stopCluster } from "@/db/server.mjs";
import { isAlive } from "@/db/server-ports.mjs";
import { dropLeftovers, TEST_CLUSTER } from "./template";

const USERS = path.join(TEST_CLUSTER, "users");

/**
 * The cluster starts when the first test asks for a database. Several runs may share it: each leaves a file with its
 * process id, and the last one out stops it.
 */
export default function setup(): () => Promise<void> {
  const mine = path.join(USERS, String(process.pid));
  mkdirSync(USERS, { recursive: true });
  writeFileSync(mine, "");
  return async () => {
    rmSync(mine, { force: true });
    for (const pid of readdirSync(USERS))
      if (!isAlive(Number(pid))) rmSync(path.join(USERS, pid), { force: true });
    if (readdirSync(USERS).length > 0 || !clusterRuns({ dir: TEST_CLUSTER })) return;
    const url = clusterUrl({ dir: TEST_CLUSTER });
    if (url) await dropLeftovers(url);
    await stopCluster({ dir: TEST_CLUSTER });
  };
}
