import { databaseAnswers, isMigrated } from "@/db/queries/health";
import type { Database } from "@/db/client";
import { logger } from "@/lib/logger";
import { mailHealth } from "@/lib/mail/health";
import { version } from "../../../package.json";

export interface Health {
  readonly ok: boolean;
  readonly version: string;
  readonly database: "up" | "down";
  readonly migrations: "up" | "down";
  readonly mailQueue: "up" | "down";
  /** Mails on their way, and mails given up; null where the database cannot tell. */
  readonly mail: { readonly waiting: number; readonly failed: number } | null;
}

/** Longest that a part may take to answer, milliseconds: a health check that hangs says nothing. */
const PATIENCE_MS = 3_000;

const within = <T>(work: Promise<T>): Promise<T> => {
  let timer: ReturnType<typeof setTimeout>;
  const late = new Promise<never>((_, reject) => {
    timer = setTimeout(() => reject(new Error(`no answer within ${PATIENCE_MS} ms`)), PATIENCE_MS);
  });
  return Promise.race([work, late]).finally(() => clearTimeout(timer));
};

/** What `work` gives, or null where it fails: the reason goes to the log, not to whoever asks. */
const orNull = <T>(part: string, work: Promise<T>): Promise<T | null> =>
  within(work).catch((error: unknown) => {
    logger.error({ part, err: error }, "health check failed");
    return null;
  });

/** State of this server process and what it stands on. */
export async function checkHealth(db: Database): Promise<Health> {
  const [answers, migrated, mail] = await Promise.all([
    orNull("database", databaseAnswers(db)),
    orNull("migrations", isMigrated(db)),
    orNull("mail queue", mailHealth(db)),
  ]);
  const state = (up: boolean | null | undefined) => (up ? "up" : "down");
  return {
    ok: Boolean(answers && migrated && mail?.working),
    version,
    database: state(answers),
    migrations: state(migrated),
    mailQueue: state(mail?.working),
    mail: mail && { waiting: mail.waiting, failed: mail.failed },
  };
}
