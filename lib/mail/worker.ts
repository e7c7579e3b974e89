import { Logger, parseCronItems, run, type Runner } from "graphile-worker";
import { setTimeout as pause } from "node:timers/promises";
import { openDatabase } from "@/db/client";
import { now } from "@/lib/clock";
import { env } from "@/lib/env";
import { logger } from "@/lib/logger";
import { mailSettings } from "./settings";
import { mailTasks, type MailDeps } from "./tasks";
import { smtpSender } from "./transport";

/** Mails sent at once per process; each holds a database connection while the mail server is spoken to. */
const CONCURRENCY = 4;
/** Milliseconds before a worker that failed (database away) is started again. */
const RESTART_MS = 5_000;

/**
 * With batching, 0.17.3 closes its pool before the last jobs are marked done on a graceful stop, and they would run again.
 */
export const WORKER_PRESET = { worker: { completeJobBatchDelay: 0, failJobBatchDelay: 0 } } as const;

/** The queue's own log, as lines of ours. Its chatter about each job is for `debug`. */
export const queueLogger = new Logger((scope) => (level, message, meta) => {
  const kind = level === "warning" ? "warn" : level === "error" ? "error" : "debug";
  logger[kind]({ queue: { ...scope, error: meta?.error } }, message);
});

export interface MailWorker {
  /** Takes no more jobs and waits for those in hand. */
  readonly stop: () => Promise<void>;
  /** False while it starts, or starts again because the database was away. */
  readonly runs: () => boolean;
}

/** Runs the jobs until `stop`; starts again by itself after the database was away. */
export function superviseMailWorker(connectionString: string, deps: MailDeps): MailWorker {
  const ending = new AbortController();
  let runner: Runner | undefined;
  const start = () =>
    run({
      connectionString,
      concurrency: CONCURRENCY,
      maxPoolSize: CONCURRENCY + 2,
      noHandleSignals: true,
      preset: WORKER_PRESET,
      logger: queueLogger,
      taskList: mailTasks(deps),
      // Every minute; of several processes on one database one does it.
      parsedCronItems: parseCronItems([
        {
          task: "sweep-mail",
          match: "* * * * *",
          options: { backfillPeriod: 0, maxAttempts: 1, jobKey: "sweep-mail" },
        },
      ]),
    });
  const running = (async () => {
    while (!ending.signal.aborted) {
      try {
        runner = await start();
        // Whatever an earlier life of this process left behind does not wait for the minute.
        await runner.addJob("sweep-mail", {}, { maxAttempts: 1, jobKey: "sweep-mail" });
        if (ending.signal.aborted) await runner.stop();
        await runner.promise;
      } catch (error) {
        if (ending.signal.aborted) return;
        logger.error({ err: error }, "the mail worker stopped; it starts again");
      }
      runner = undefined;
      await pause(RESTART_MS, undefined, { signal: ending.signal }).catch(() => undefined);
    }
  })();
  return {
    runs: () => runner !== undefined && !ending.signal.aborted,
    stop: async () => {
      ending.abort();
      await runner
        ?.stop()
        .catch((error: unknown) => logger.warn({ err: error }, "the mail worker was already stopping"));
      await running;
    },
  };
}

/** The mail worker of this server process, with a pool of its own. */
export function startMailWorker(): MailWorker {
  const { DATABASE_URL } = env();
  const { db, sql } = openDatabase(DATABASE_URL, { max: CONCURRENCY + 1 });
  const worker = superviseMailWorker(DATABASE_URL, { db, send: smtpSender(mailSettings()), now });
  return {
    ...worker,
    stop: async () => {
      await worker.stop();
      await sql.end({ timeout: 5 });
    },
  };
}
