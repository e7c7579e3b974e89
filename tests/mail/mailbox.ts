import { mkdtemp, readdir, readFile, rm } from "node:fs/promises";
import { tmpdir } from "node:os";
import path from "node:path";
import { runOnce } from "graphile-worker";
import { simpleParser, type ParsedMail } from "mailparser";
import { afterAll } from "vitest";
import { startCatcher } from "@/lib/mail/catcher.mjs";
import { mailSettings } from "@/lib/mail/settings";
import { mailTasks, type MailDeps } from "@/lib/mail/tasks";
import { smtpSender } from "@/lib/mail/transport";
import { WORKER_PRESET, queueLogger } from "@/lib/mail/worker";
import type { TestDatabase } from "../setup/database";

export interface Caught {
  readonly envelope: { readonly from: string; readonly to: readonly string[] };
  /** Exactly as it came over the wire. */
  readonly source: string;
  readonly mail: ParsedMail;
}

/** A real SMTP server on loopback for one test file, and what it caught. */
export async function mailbox() {
  const dir = await mkdtemp(path.join(tmpdir(), "bellward-mail-"));
  let catcher: Awaited<ReturnType<typeof startCatcher>> | null = await startCatcher({ dir });
  const { port } = catcher;
  process.env.SMTP_URL = `smtp://127.0.0.1:${port}`;
  const stop = async () => {
    await catcher?.close();
    catcher = null;
  };
  afterAll(async () => {
    await stop();
    await rm(dir, { recursive: true, force: true });
  });
  return {
    dir,
    url: `smtp://127.0.0.1:${port}`,
    stop,
    restart: async () => {
      catcher = await startCatcher({ dir, port });
    },
    caught: async (): Promise<Caught[]> => {
      const names = (await readdir(dir)).filter((name) => name.endsWith(".json")).sort();
      return Promise.all(
        names.map(async (name) => {
          const source = await readFile(path.join(dir, name.replace(/json$/, "eml")));
          const { envelope } = JSON.parse(await readFile(path.join(dir, name), "utf8")) as Pick<
            Caught,
            "envelope"
          >;
          return { envelope, source: source.toString("latin1"), mail: await simpleParser(source) };
        }),
      );
    },
  };
}

/** What the jobs need, with the real SMTP transport. */
export const mailDeps = (
  { db }: Pick<TestDatabase, "db">,
  smtpUrl: string,
  now = () => new Date(),
): MailDeps => ({
  db,
  now,
  send: smtpSender({ ...mailSettings(), smtpUrl }),
});

/** Runs every job that is due, one worker, to the end. */
export const runDueJobs = (url: string, deps: MailDeps) =>
  runOnce({
    connectionString: url,
    taskList: mailTasks(deps),
    preset: WORKER_PRESET,
    noHandleSignals: true,
    logger: queueLogger,
    parsedCronItems: [],
  });

/** Time passes for the queue: everything that waits is due now. */
export const makeJobsDue = async ({ sql }: Pick<TestDatabase, "sql">): Promise<void> => {
  await sql`update graphile_worker._private_jobs set run_at = now() where locked_at is null`;
};

/** Jobs that wait, with the seconds until they are due. */
export const waitingJobs = ({ sql }: Pick<TestDatabase, "sql">) =>
  sql<{ task: string; attempts: number; seconds: number }[]>`
    select task_identifier as task, attempts, extract(epoch from run_at - now())::float8 as seconds
      from graphile_worker.jobs order by id`;
