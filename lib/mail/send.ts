import type { Database } from "@/db/client";
import { addSendJob, claimMail, updateMailAfterTry } from "@/db/queries/mails";
import { logger } from "@/lib/logger";
import { UndeliverableError, type SendMail } from "./transport";

export type SendOutcome = "sent" | "failed" | "later" | "nothing";

/** Seconds. RFC 5321 4.5.4.1 asks for 30 minutes between tries; the first ones are quicker, for a server that restarts. */
const LONGEST_WAIT = 30 * 60;

/** Seconds until the next try, after `tries` of them: 3, 7, 20, 55, 148, 403, 1097, then every 30 minutes. */
export const waitAfter = (tries: number): number => Math.min(LONGEST_WAIT, Math.exp(Math.max(1, tries)));

/**
 * Sends one mail, if it waits and nobody else is sending it. The row stays locked while the mail server is spoken to, so a
 * mail goes out once; only a crash between the server's answer and the commit repeats it, with the same Message-ID.
 * Where the server is away or defers it, the next try is queued in the same transaction.
 */
export async function sendQueuedMail(
  deps: { db: Database; send: SendMail; now: () => Date },
  mailId: string,
): Promise<SendOutcome> {
  return deps.db.transaction(async (tx) => {
    const mail = await claimMail(tx, mailId);
    if (!mail) return "nothing";
    try {
      await deps.send(mail);
    } catch (error) {
      const over = mail.stale || error instanceof UndeliverableError;
      await updateMailAfterTry(tx, mailId, over ? "failed" : "waiting", deps.now());
      logger.warn(
        { mailId, tries: mail.attempts + 1, err: error },
        over ? "mail given up" : "mail not sent; tried again later",
      );
      if (over) return "failed";
      await addSendJob(tx, mailId, waitAfter(mail.attempts + 1));
      return "later";
    }
    await updateMailAfterTry(tx, mailId, "sent", deps.now());
    return "sent";
  });
}
