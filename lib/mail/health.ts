import type { Tx } from "@/db/client";
import { countMails } from "@/db/queries/mails";

export interface MailHealth {
  /** This process works on the queue. */
  readonly working: boolean;
  readonly waiting: number;
  /** Given up: refused for good, or tried for five days. */
  readonly failed: number;
}

/** State of the mail queue as seen by this server process. Rejects where the database does not answer. */
export async function mailHealth(tx: Tx): Promise<MailHealth> {
  return { working: globalThis.bellwardMailWorker?.runs() ?? false, ...(await countMails(tx)) };
}
