// `npm start` and, with --dev, `npm run dev`: from a bare machine to a running Bellward; Ctrl-C takes it all down again.
import { clusterRuns, DEFAULT_DIR, startCluster, stopCluster } from "../../db/server.mjs";
import { endRunning, explain, runMain, SetupError } from "./command.mjs";
import { claimInstance, forgetInstance, refuseTakenPort, rememberInstance, wantedPort } from "./instance.mjs";
import { ensurePackages } from "./packages.mjs";
import { say, step } from "./progress.mjs";
import { checkNode, inData, localSecret, makeDataFolder, readDotEnv } from "./project.mjs";

const dev = process.argv.includes("--dev");
const children = [];
let stopping = null;
let ownsInstance = false;

/** Takes down what was started, newest first. A second call waits for the first. */
function takeDown() {
  stopping ??= (async () => {
    await endRunning();
    if (children.length > 0) {
      const { endChild } = await import("./stack.mjs");
      for (const child of children.reverse()) await endChild(child);
    }
    if (ownsInstance && clusterRuns({ dir: DEFAULT_DIR })) await stopCluster({ dir: DEFAULT_DIR });
    if (ownsInstance) forgetInstance();
  })();
  return stopping;
}

function stopAndExit(code) {
  if (stopping) return;
  say("\nStopping …");
  void takeDown().then(
    () => {
      say("Stopped.");
      process.exit(code);
    },
    (error) => {
      console.error(`bellward: ${explain(String(error.message))}`);
      process.exit(1);
    },
  );
}

function stopWhenTold() {
  process.on("SIGINT", () => stopAndExit(0));
  process.on("SIGTERM", () => stopAndExit(143));
  process.on("SIGHUP", () => stopAndExit(129));
  // npm passes SIGTERM to its shell, and that dies without telling us: losing the shell means being told.
  const { ppid } = process;
  if (process.env.npm_lifecycle_event)
    setInterval(() => process.ppid !== ppid && stopAndExit(143), 500).unref();
}

/** Settings of the server: what the environment gives, and a local stand-in for the rest. */
async function settings(address, databaseUrl) {
  const nextAuthUrl = process.env.NEXTAUTH_URL || address;
  const env = {
    DATABASE_URL: databaseUrl,
    NEXTAUTH_URL: nextAuthUrl,
    APP_URL: process.env.APP_URL || nextAuthUrl,
    NEXTAUTH_SECRET: process.env.NEXTAUTH_SECRET || localSecret(),
    MAIL_FROM: process.env.MAIL_FROM || "Bellward <bellward@localhost>",
  };
  if (process.env.SMTP_URL) return env;
  const { startCatcher } = await import("./stack.mjs");
  const outbox = inData("outbox");
  const catcher = await startCatcher(outbox, (child) => children.push(child));
  return { ...env, SMTP_URL: catcher.smtpUrl, BELLWARD_OUTBOX_DIR: outbox };
}

async function readyDatabase() {
  const given = process.env.DATABASE_URL;
  const local = given ? null : await startCluster({ log: say });
  const url = given || local.url;
  const { demoAccounts, isEmpty, mayHaveDemo, migrateOrExplain, publicAddress, seedDemo } =
    await import("./database.mjs");
  say(`Database: ${publicAddress(url)}${given ? " (DATABASE_URL)" : ""}`);
  await migrateOrExplain(url);
  if (!(await isEmpty(url))) return { url, accounts: given ? [] : demoAccounts() };
  if (!mayHaveDemo(url)) {
    say(
      "The database is empty and on another host: no demo. BELLWARD_DEMO=1 puts it there, with its public passwords.",
    );
    return { url, accounts: [] };
  }
  await step("Laying out the demo", () => seedDemo(url));
  return { url, accounts: demoAccounts() };
}

function announce(address, accounts, env) {
  say(`\nBellward is at ${address}`);
  if (accounts.length > 0) say(["Demo accounts:", ...accounts].join("\n  "));
  if (env.BELLWARD_OUTBOX_DIR)
    say(`Mail is caught, none leaves this machine: ${address}/outbox (files in .data/outbox)`);
  say("Ctrl-C stops it.");
}

async function main() {
  checkNode();
  readDotEnv();
  const port = wantedPort();
  const address = `http://127.0.0.1:${port}`;
  if (process.env.SMTP_URL && !process.env.MAIL_FROM)
    throw new SetupError("SMTP_URL is set, but MAIL_FROM (the sender of the mails) is not");
  makeDataFolder();
  await claimInstance(address);
  ownsInstance = true;
  stopWhenTold();
  await refuseTakenPort(port);
  await ensurePackages();
  const { url, accounts } = await readyDatabase();
  if (!dev) {
    const { ensureBuild } = await import("./build.mjs");
    await ensureBuild();
  }
  const env = await settings(address, url);
  rememberInstance(address, children);
  const { startServer } = await import("./stack.mjs");
  const onStart = (child) => (children.push(child), rememberInstance(address, children));
  await startServer({ port, env, dev, onStart });
  if (stopping) return stopping;
  announce(address, accounts, env);
  const first = await Promise.race(children.map(({ what, ended }) => ended.then((code) => ({ what, code }))));
  if (!stopping) throw new SetupError(`the ${first.what} ended by itself (exit code ${first.code})`);
  return stopping;
}

await runMain(async () => {
  try {
    await main();
  } catch (error) {
    // What fails because it is being stopped is no failure.
    if (!stopping) throw error;
  } finally {
    await takeDown();
  }
});
