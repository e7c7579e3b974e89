import { randomUUID } from "node:crypto";
import type { Tx } from "@/db/client";
import { addSendJob, insertMail } from "@/db/queries/mails";
import { oneLine } from "./one-line";
import { mailSettings } from "./settings";

export interface OutgoingMail {
  /** Deduplicates: the same key is one mail, however often it is queued. */
  readonly key: string;
  /** What it is for ("reset", "invite", "changes"): for lists and logs. */
  readonly kind: string;
  /** One address, without a name. */
  readonly to: string;
  readonly userId?: string | null;
  readonly teamId?: string | null;
  readonly subject: string;
  readonly text: string;
  readonly html: string;
  readonly headers?: Readonly<Record<string, string>>;
}

/** A fresh Message-ID in the sender's domain. */
export const messageId = (): string => `<${randomUUID()}@${mailSettings().domain}>`;

/**
 * Writes a mail and the job that sends it in the caller's transaction: both are there when it commits, neither when it does
 * not. Message-ID is fixed here, so that a retry is the same message (RFC 5322 3.6.4). Returns the mail's id, or null where
 * the key was queued before.
 */
export async function queueMail(tx: Tx, mail: OutgoingMail): Promise<string | null> {
  const id = await insertMail(tx, {
    key: mail.key,
    kind: mail.kind,
    recipient: oneLine(mail.to),
    userId: mail.userId ?? null,
    teamId: mail.teamId ?? null,
    messageId: messageId(),
    subject: oneLine(mail.subject),
    text: mail.text,
    html: mail.html,
    // RFC 3834 section 5: no out-of-office answers to a machine.
    headers: { "Auto-Submitted": "auto-generated", ...mail.headers },
  });
  if (id !== null) await addSendJob(tx, id);
  return id;
}
