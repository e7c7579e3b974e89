import { createTransport } from "nodemailer";
import type SMTPTransport from "nodemailer/lib/smtp-transport";
import type { MailRow } from "@/db/queries/mails";
import type { MailSettings } from "./settings";

/** Hands one mail to the mail server. Rejects with `UndeliverableError` where trying again is of no use. */
export type SendMail = (mail: MailRow) => Promise<void>;

/** The mail server refused this recipient or this message for good. */
export class UndeliverableError extends Error {
  override readonly name = "UndeliverableError";
}

/**
 * Signed where they occur. RFC 8058 section 4 asks that both unsubscribe headers are; nodemailer's own list has only one.
 */
const SIGNED =
  "From:To:Subject:Date:Message-ID:MIME-Version:Content-Type:Content-Transfer-Encoding:List-Id:List-Unsubscribe:List-Unsubscribe-Post:Auto-Submitted";

/** One address and nothing else: nodemailer reads commas as further recipients, in values as well as in text. */
const ONE_ADDRESS = /^[^\s@,;:<>()[\]"\\]+@[^\s@,;:<>()[\]"\\]+$/;

/** Milliseconds. A server that hangs must not hold a worker: the job comes again. */
const TIMEOUTS = {
  connectionTimeout: 10_000,
  greetingTimeout: 10_000,
  socketTimeout: 30_000,
  dnsTimeout: 10_000,
};

/** True for a lasting refusal of recipient or content (RFC 5321 4.2.1: 5yz). A refused login is ours to mend: it is not. */
const isFinal = (error: unknown): boolean =>
  error instanceof Error &&
  "code" in error &&
  (error.code === "EENVELOPE" || error.code === "EMESSAGE") &&
  "responseCode" in error &&
  typeof error.responseCode === "number" &&
  error.responseCode >= 500;

export function smtpSender(settings: MailSettings): SendMail {
  const options: SMTPTransport.Options = {
    url: settings.smtpUrl,
    ...TIMEOUTS,
    ...(settings.dkim && { dkim: { ...settings.dkim, headerFieldNames: SIGNED } }),
    disableFileAccess: true,
    disableUrlAccess: true,
  };
  const transport = createTransport(options);
  return async (mail) => {
    if (!ONE_ADDRESS.test(mail.recipient)) throw new UndeliverableError("The recipient is no address.");
    try {
      await transport.sendMail({
        from: settings.from,
        to: { name: "", address: mail.recipient },
        envelope: { from: settings.from.address, to: [mail.recipient] },
        messageId: mail.messageId,
        date: mail.createdAt,
        subject: mail.subject,
        text: mail.text,
        html: mail.html,
        headers: mail.headers,
      });
    } catch (error) {
      if (isFinal(error))
        throw new UndeliverableError("The mail server refused the mail for good.", { cause: error });
      throw error;
    }
  };
}
