import { z } from "zod";

const environment = z.object({
  APP_URL: z.url().optional(),
  SMTP_URL: z
    .string()
    .regex(/^smtps?:\/\//, "SMTP_URL must begin with smtp:// or smtps://")
    .optional(),
  /** Shown as sender, `Name <address>` or an address. */
  MAIL_FROM: z.string().optional(),
  DKIM_DOMAIN: z.string().min(1).optional(),
  DKIM_SELECTOR: z.string().min(1).optional(),
  /** PEM; line breaks may be written as \n. */
  DKIM_KEY: z.string().min(1).optional(),
  BELLWARD_OUTBOX_DIR: z.string().min(1).optional(),
});

export interface MailSettings {
  /** Without a slash at the end. */
  readonly appUrl: string;
  /** Null: mails are written and wait. */
  readonly smtpUrl: string | null;
  readonly from: { readonly name: string; readonly address: string };
  /** Domain of Message-ID and List-Id. */
  readonly domain: string;
  readonly dkim: {
    readonly domainName: string;
    readonly keySelector: string;
    readonly privateKey: string;
  } | null;
  /** Folder of the local catcher, where one runs. */
  readonly outboxDir: string | null;
}

const FROM = /^\s*(?:"?([^"<>]*?)"?\s*)<([^<>\s]+@[^<>\s]+)>\s*$/;

function senderOf(text: string | undefined, domain: string): MailSettings["from"] {
  const parts = FROM.exec(text ?? "");
  if (parts?.[2] !== undefined) return { name: parts[1] ?? "", address: parts[2] };
  if (text !== undefined && /^[^\s<>]+@[^\s<>]+$/.test(text)) return { name: "Bellward", address: text };
  if (text !== undefined && text !== "") throw new Error("MAIL_FROM must be an address or `Name <address>`.");
  return { name: "Bellward", address: `no-reply@${domain}` };
}

/** An IP address cannot stand for a domain in an address; such an installation is a local one. */
const domainOf = (host: string): string => (/^[\d.]+$|^\[/.test(host) ? "localhost" : host);

const emptyAsMissing = (env: NodeJS.ProcessEnv) =>
  Object.fromEntries(Object.entries(env).filter(([, value]) => value !== ""));

/** Reads what mail needs from the environment. Throws with the name of the variable that is wrong. */
export function mailSettings(env: NodeJS.ProcessEnv = process.env): MailSettings {
  const read = environment.parse(emptyAsMissing(env));
  const appUrl = (read.APP_URL ?? `http://127.0.0.1:${env.PORT ?? "3000"}`).replace(/\/+$/, "");
  const host = domainOf(new URL(appUrl).hostname);
  const from = senderOf(read.MAIL_FROM, host);
  const { DKIM_DOMAIN: domainName, DKIM_SELECTOR: keySelector, DKIM_KEY: key } = read;
  return {
    appUrl,
    smtpUrl: read.SMTP_URL ?? null,
    from,
    domain: from.address.split("@").at(-1) ?? host,
    dkim:
      domainName && keySelector && key
        ? { domainName, keySelector, privateKey: key.replace(/\\n/g, "\n") }
        : null,
    outboxDir: read.BELLWARD_OUTBOX_DIR ?? null,
  };
}
