import type { TaskList } from "graphile-worker";
import { z } from "zod";
import { addSendJob, listStrandedMails } from "@/db/queries/mails";
import { addCollectJobs, listForgottenReaders } from "@/db/queries/notices";
import type { Database } from "@/db/client";
import { logger } from "@/lib/logger";
import { collectChanges } from "./collect";
import { mailReset } from "./reset";
import { sendQueuedMail } from "./send";
import type { SendMail } from "./transport";

export interface MailDeps {
  readonly db: Database;
  readonly send: SendMail;
  readonly now: () => Date;
}

const sendPayload = z.object({ mailId: z.guid() });
const resetPayload = z.object({ email: z.string().max(254) });
const collectPayload = z.object({ userId: z.guid(), since: z.iso.datetime(), digest: z.boolean() });

/**
 * Sets going again what a killed process left behind. Live processes are not disturbed: what they hold is locked, and every
 * job may run twice without a second mail.
 */
export async function sweep({
  db,
  now,
}: Pick<MailDeps, "db" | "now">): Promise<{ mails: number; readers: number }> {
  return db.transaction(async (tx) => {
    const stranded = await listStrandedMails(tx);
    for (const id of stranded) await addSendJob(tx, id);
    const at = now();
    const forgotten = await listForgottenReaders(tx, at);
    await addCollectJobs(
      tx,
      forgotten.map(({ userId, since }) => ({
        userId,
        since,
        digest: true,
        now: at,
        runAt: at,
        key: `collect:${userId}`,
      })),
    );
    return { mails: stranded.length, readers: forgotten.length };
  });
}

/** The jobs of mail. */
export function mailTasks(deps: MailDeps): TaskList {
  return {
    "send-mail": async (payload) => {
      await sendQueuedMail(deps, sendPayload.parse(payload).mailId);
    },
    "collect-changes": async (payload) => {
      const { userId, since, digest } = collectPayload.parse(payload);
      await collectChanges(deps, { userId, since: new Date(since), digest });
    },
    "mail-reset": async (payload) => {
      await mailReset(deps, resetPayload.parse(payload).email);
    },
    "sweep-mail": async () => {
      const found = await sweep(deps);
      if (found.mails + found.readers > 0)
        logger.warn(found, "mail left behind by a process that ended: set going again");
    },
  };
}
