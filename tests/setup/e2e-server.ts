// What Playwright tests: the production build on a seeded clone of the template database, with a mail catcher of its own.
import { mkdirSync, rmSync, writeFileSync } from "node:fs";
import path from "node:path";
import { ensureBuild } from "@/lib/run/build.mjs";
import { endRunning } from "@/lib/run/command.mjs";
import { seedDemo } from "@/lib/run/database.mjs";
import { endChild, startCatcher, startServer, type Child } from "@/lib/run/stack.mjs";
import { e2eFolder, type BrowserTestServer } from "./e2e";
import { cloneDatabase, holdTestCluster } from "./template";

const port = Number(process.env.BELLWARD_E2E_PORT);
const folder = e2eFolder(port);
const undo: (() => Promise<unknown>)[] = [holdTestCluster()];

let stopping: Promise<void> | undefined;
async function stop(code: number): Promise<void> {
  stopping ??= (async () => {
    await endRunning();
    for (const step of undo.reverse()) await step();
    rmSync(folder, { recursive: true, force: true });
  })();
  await stopping;
  process.exit(code);
}
for (const signal of ["SIGTERM", "SIGINT", "SIGHUP"] as const) process.on(signal, () => void stop(0));
const ended = (child: Child) => undo.push(() => endChild(child));

async function start(): Promise<void> {
  await ensureBuild();
  const { url: databaseUrl, drop } = await cloneDatabase();
  undo.push(drop);
  const outboxDir = path.join(folder, "outbox");
  mkdirSync(outboxDir, { recursive: true });
  const { smtpUrl } = await startCatcher(outboxDir, ended);
  const url = `http://127.0.0.1:${port}`;
  const env = {
    DATABASE_URL: databaseUrl,
    SMTP_URL: smtpUrl,
    BELLWARD_OUTBOX_DIR: outboxDir,
    MAIL_FROM: "Bellward <camp@bellward.test>",
    NEXTAUTH_SECRET: "a-secret-for-tests-only-of-32-chars-or-more",
    NEXTAUTH_URL: url,
    APP_URL: url,
    BELLWARD_TEST: "1",
    LOG_LEVEL: "warn",
  };
  await seedDemo(databaseUrl, env);
  const server: BrowserTestServer = { url, databaseUrl, outboxDir };
  writeFileSync(path.join(folder, "server.json"), JSON.stringify(server));
  await startServer({ port, env, onStart: ended });
}

start().catch((error: unknown) => {
  console.error(error);
  void stop(1);
});
