import { env, type Env } from "@/lib/env";

export interface MailSettings {
  /** Without a slash at its end. */
  readonly appUrl: string;
  readonly smtpUrl: string;
  readonly from: { readonly name: string; readonly address: string };
  /** Domain of Message-ID and List-Id: the sender's. */
  readonly domain: string;
  readonly dkim: {
    readonly domainName: string;
    readonly keySelector: string;
    readonly privateKey: string;
  } | null;
}

type MailEnv = Pick<Env, "APP_URL" | "SMTP_URL" | "MAIL_FROM" | "DKIM_DOMAIN" | "DKIM_SELECTOR" | "DKIM_KEY">;

const NAMED = /^\s*"?([^"<>]*?)"?\s*<([^<>\s@]+@[^<>\s@]+)>\s*$/;
const BARE = /^[^<>\s@]+@[^<>\s@]+$/;

function senderOf(text: string): MailSettings["from"] {
  const [, name = "", address] = NAMED.exec(text) ?? [];
  if (address !== undefined) return { name, address };
  if (BARE.test(text.trim())) return { name: "Bellward", address: text.trim() };
  throw new Error("MAIL_FROM must be `Name <address>` or an address.");
}

/** What mail needs of the settings. Throws with the name of the setting that is wrong. */
export function mailSettings(from: MailEnv = env()): MailSettings {
  const sender = senderOf(from.MAIL_FROM);
  const dkim = [from.DKIM_DOMAIN, from.DKIM_SELECTOR, from.DKIM_KEY];
  const [domainName, keySelector, key] = dkim;
  if (dkim.some(Boolean) && !dkim.every(Boolean))
    throw new Error("DKIM_DOMAIN, DKIM_SELECTOR and DKIM_KEY go together.");
  return {
    appUrl: from.APP_URL,
    smtpUrl: from.SMTP_URL,
    from: sender,
    domain: sender.address.split("@").at(-1) ?? "localhost",
    dkim:
      domainName && keySelector && key
        ? { domainName, keySelector, privateKey: key.replace(/\\n/g, "\n") }
        : null,
  };
}
