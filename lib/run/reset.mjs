// `npm run db:reset [-- --yes]`: drops the local database and makes it anew, with the demo. Never touches DATABASE_URL's.
import { createInterface } from "node:readline/promises";
import { clusterRuns, clusterUrl, psql, removeCluster, startCluster, stopCluster } from "../../db/server.mjs";
import { runMain, SetupError } from "./command.mjs";
import { runningInstance } from "./instance.mjs";
import { ensurePackages } from "./packages.mjs";
import { say, step } from "./progress.mjs";
import { checkNode, makeDataFolder, readDotEnv } from "./project.mjs";

async function confirmed() {
  if (process.argv.includes("--yes")) return true;
  if (!process.stdin.isTTY)
    throw new SetupError("this deletes the local database; say --yes (npm run db:reset -- --yes)");
  const terminal = createInterface({ input: process.stdin, output: process.stdout });
  try {
    return /^y(es)?$/i.test(
      (await terminal.question("Delete everything in the local database? [y/N] ")).trim(),
    );
  } finally {
    terminal.close();
  }
}

/** Drops the database; a cluster too damaged to start goes altogether. */
async function dropDatabase() {
  try {
    if (clusterUrl()) {
      await startCluster({ log: say });
      await psql(
        undefined,
        "drop database if exists bellward with (force); create database bellward",
        "postgres",
      );
    }
  } catch (error) {
    if (!(error instanceof SetupError)) throw error;
    say(`The cluster is damaged (${error.message.split(";")[0]}): making a new one.`);
    await removeCluster();
  }
  return startCluster({ log: say });
}

await runMain(async () => {
  checkNode();
  readDotEnv();
  if (process.env.DATABASE_URL)
    throw new SetupError(
      "DATABASE_URL names a database that is not ours to delete; unset it to reset the local one",
    );
  const instance = runningInstance();
  if (instance)
    throw new SetupError(`Bellward is running (${instance.address}, process ${instance.pid}); stop it first`);
  if (!(await confirmed())) {
    say("Nothing was changed.");
    return;
  }
  makeDataFolder();
  await ensurePackages();
  const wasRunning = clusterRuns();
  const { url } = await dropDatabase();
  const { migrateOrExplain, seedDemo } = await import("./database.mjs");
  await migrateOrExplain(url);
  await step("Laying out the demo", () => seedDemo(url));
  if (!wasRunning) await stopCluster();
  say("The local database is new.");
});
