import type { Database } from "@/db/client";
import { claimMail, updateMailAfterTry } from "@/db/queries/mails";
import { UndeliverableError, type SendMail } from "./transport";

export type SendOutcome = "sent" | "failed" | "nothing";

/**
 * Sends one mail, if it waits and nobody else is sending it. The row stays locked while the mail server is spoken to, so a
 * mail goes out once; only a crash between the server's answer and the commit repeats it, with the same Message-ID.
 * Rejects where it should be tried again; on the last try the mail is marked failed instead.
 */
export async function sendQueuedMail(
  deps: { db: Database; send: SendMail; now: () => Date },
  mailId: string,
  lastTry: boolean,
): Promise<SendOutcome> {
  const result = await deps.db.transaction(async (tx): Promise<{ outcome: SendOutcome; error?: unknown }> => {
    const mail = await claimMail(tx, mailId);
    if (!mail) return { outcome: "nothing" };
    try {
      await deps.send(mail);
    } catch (error) {
      const over = lastTry || error instanceof UndeliverableError;
      await updateMailAfterTry(tx, mailId, over ? "failed" : "waiting", deps.now());
      return over ? { outcome: "failed" } : { outcome: "nothing", error };
    }
    await updateMailAfterTry(tx, mailId, "sent", deps.now());
    return { outcome: "sent" };
  });
  // Thrown only now: inside, it would roll the count of tries back.
  if (result.error !== undefined) throw result.error;
  return result.outcome;
}
