import { fork, type ChildProcess } from "node:child_process";
import { once } from "node:events";
import path from "node:path";
import { SMTPServer } from "smtp-server";
import { eq } from "drizzle-orm";
import { afterAll, describe, expect, it } from "vitest";
import { mails } from "@/db/schema";
import { queueMail } from "@/lib/mail/queue";
import { sweep } from "@/lib/mail/tasks";
import { superviseMailWorker } from "@/lib/mail/worker";
import { testDatabase } from "../setup/database";
import { mailDeps, mailbox, runDueJobs } from "./mailbox";

const database = await testDatabase();
const { db, sql, url } = database;
const box = await mailbox();
const children: ChildProcess[] = [];
afterAll(() => {
  for (const child of children) child.kill("SIGKILL");
});

/** A mail server that reads the whole message and answers only when told to: the moment between send and sent. */
async function slowServer() {
  let answer: () => void = () => undefined;
  let arrived: () => void = () => undefined;
  const inHand = new Promise<void>((resolve) => (arrived = resolve));
  const server = new SMTPServer({
    authOptional: true,
    disabledCommands: ["AUTH", "STARTTLS"],
    closeTimeout: 100,
    onData(stream, _session, done) {
      stream.resume();
      stream.once("end", () => {
        answer = () => done();
        arrived();
      });
    },
  });
  await new Promise<void>((resolve) => server.listen(0, "127.0.0.1", resolve));
  const address = server.server.address();
  const port = typeof address === "object" && address ? address.port : 0;
  return {
    url: `smtp://127.0.0.1:${port}`,
    inHand,
    answer: () => answer(),
    close: () => new Promise<void>((resolve) => server.close(() => resolve())),
  };
}

function startWorker(smtpUrl: string) {
  const child = fork(path.join(import.meta.dirname, "worker-child.ts"), {
    execArgv: ["--import", "tsx"],
    env: { ...process.env, DATABASE_URL: url, SMTP_URL: smtpUrl },
    stdio: ["ignore", "ignore", "inherit", "ipc"],
  });
  children.push(child);
  const failed = once(child, "exit").then(([code]) => {
    if (code !== 0 && code !== null) throw new Error(`the worker ended with exit code ${code}`);
  });
  return { child, failed };
}

const letter = (key: string) => ({
  key,
  kind: "test",
  to: "ines@gym.example",
  subject: key,
  text: "Text",
  html: "<p>HTML</p>",
});
const rowOf = async (key: string) => (await db.select().from(mails).where(eq(mails.key, key)))[0];

/** Connections of the worker: those of this test and of the jobs' own pool say postgres.js. */
const othersConnected = () =>
  sql<{ pid: number }[]>`select pid from pg_stat_activity
    where datname = current_database() and backend_type = 'client backend' and application_name <> 'postgres.js'`;

// A child process compiles what it imports: slow where other tests take the processors.
describe("a server process", { timeout: 90_000 }, () => {
  it("killed while it sends loses no mail: another one sends it, under the same Message-ID", async () => {
    const slow = await slowServer();
    const { child, failed } = startWorker(slow.url);
    await db.transaction((tx) => queueMail(tx, letter("killed")));
    const before = await rowOf("killed");
    await Promise.race([slow.inHand, failed]);
    child.kill("SIGKILL");
    await once(child, "exit");
    await slow.close();
    expect(await rowOf("killed")).toMatchObject({ status: "waiting", attempts: 0 });
    // The dead worker's lock stays for hours; only the clock is moved here, as if two minutes had passed.
    const locked =
      await sql`select 1 from graphile_worker._private_jobs where locked_at is not null and key like 'mail:%'`;
    expect(locked).toHaveLength(1);
    await sql`update graphile_worker._private_jobs set locked_at = locked_at - interval '2 minutes' where locked_at is not null`;
    await sql`update mails set created_at = created_at - interval '2 minutes'`;
    const deps = mailDeps(database, box.url);
    // The killed process's connection may be a moment in dying; its claim ends with it.
    await expect.poll(async () => (await sweep(deps)).mails, { timeout: 10_000 }).toBe(1);
    await runDueJobs(url, deps);
    const caught = (await box.caught()).filter(({ mail }) => mail.subject === "killed");
    expect(caught.map(({ mail }) => mail.messageId)).toEqual([before?.messageId]);
    expect(await rowOf("killed")).toMatchObject({ status: "sent" });
  });

  it("asked to stop finishes the mail in hand, and leaves its job done, not locked", async () => {
    await sql`delete from graphile_worker._private_jobs`;
    const slow = await slowServer();
    const { child, failed } = startWorker(slow.url);
    await db.transaction((tx) => queueMail(tx, letter("graceful")));
    await Promise.race([slow.inHand, failed]);
    child.kill("SIGTERM");
    slow.answer();
    expect(await once(child, "exit")).toEqual([0, null]);
    await slow.close();
    expect(await rowOf("graceful")).toMatchObject({ status: "sent", attempts: 1 });
    expect(await sql`select 1 from graphile_worker.jobs where task_identifier = 'send-mail'`).toHaveLength(0);
  });

  it("whose database connections are cut goes on by itself", async () => {
    const worker = superviseMailWorker(url, mailDeps(database, box.url));
    const sent = async (key: string) => {
      await db.transaction((tx) => queueMail(tx, letter(key)));
      await expect.poll(async () => (await rowOf(key))?.status, { timeout: 40_000 }).toBe("sent");
    };
    await sent("before");
    for (const { pid } of await othersConnected()) await sql`select pg_terminate_backend(${pid})`;
    await sent("after");
    await worker.stop();
    // Its pool says goodbye a moment after its last job; the database of this file must not be dropped before.
    await expect.poll(async () => (await othersConnected()).length, { timeout: 10_000 }).toBe(0);
  });
});
