import { expect } from "@playwright/test";
import { listCaught, readCaught, type CaughtMail } from "@/lib/mail/outbox";
import { browserTestServer } from "../setup/e2e";

/** Mails to one address that the catcher holds, oldest first. */
export async function mailsTo(address: string): Promise<CaughtMail[]> {
  const dir = browserTestServer().outboxDir;
  const entries = (await listCaught(dir)).filter(({ envelope }) => envelope.to.includes(address));
  const mails = await Promise.all(entries.reverse().map(({ id }) => readCaught(dir, id)));
  return mails.filter((mail) => mail !== null);
}

/** The only mail to an address, once it has arrived. */
export async function onlyMailTo(address: string): Promise<CaughtMail> {
  await expect.poll(async () => (await mailsTo(address)).length, { timeout: 60_000 }).toBe(1);
  const [mail] = await mailsTo(address);
  if (!mail) throw new Error("The mail went away.");
  return mail;
}

export const headerOf = (mail: CaughtMail, name: string): string | undefined =>
  mail.headers.find((header) => header.name.toLowerCase() === name.toLowerCase())?.value;

/** The one link of a mail that leads below a path of this site. */
export function linkTo(mail: CaughtMail, path: string): string {
  const [link, another] = mail.links.filter((candidate) => new URL(candidate).pathname.startsWith(path));
  expect(another).toBeUndefined();
  if (link === undefined) throw new Error(`No link to ${path} in: ${mail.text}`);
  return link;
}
