import { chromium, type Browser, type Page } from "@playwright/test";
import { CHROMIUM, CHROMIUM_FLAGS } from "@/lib/run/chromium.mjs";
import demo from "../../db/seed/accounts.json";

export const openBrowser = (): Promise<Browser> =>
  chromium.launch({ executablePath: CHROMIUM, args: CHROMIUM_FLAGS });

/** Signs a demo account in; the page then holds its session. */
export async function signIn(page: Page, url: string, role: string): Promise<void> {
  const account = demo.accounts.find((candidate) => candidate.role === role);
  if (!account) throw new Error(`There is no demo account for ${role}.`);
  await page.goto(`${url}/sign-in`);
  await page.getByLabel("E-mail").fill(account.email);
  await page.getByLabel("Password").fill(demo.password);
  await page.getByRole("button", { name: "Sign in" }).click();
  await page.waitForURL((address) => !address.pathname.startsWith("/sign-in"));
}

/** Quiet for so long, the page has all the script that it asks for by itself. */
const QUIET_MS = 1500;

/**
 * Bytes of JavaScript, as sent, that a page asks for by itself. A context of its own, so nothing is cached. The line of live
 * changes stays open, so "network idle" would never come: what counts is that no script arrives any more.
 */
export async function firstLoadScript(browser: Browser, address: string, storage?: string): Promise<number> {
  const context = await browser.newContext(storage ? { storageState: JSON.parse(storage) } : {});
  const page = await context.newPage();
  const session = await context.newCDPSession(page);
  await session.send("Network.enable");
  const scripts = new Set<string>();
  let bytes = 0;
  let newest = Date.now();
  session.on("Network.responseReceived", ({ requestId, type }) => {
    if (type !== "Script") return;
    scripts.add(requestId);
    newest = Date.now();
  });
  // Of the body: what a finished request counts has its headers in it.
  session.on("Network.dataReceived", ({ requestId, encodedDataLength }) => {
    if (!scripts.has(requestId)) return;
    bytes += encodedDataLength;
    newest = Date.now();
  });
  await page.goto(address, { waitUntil: "load" });
  while (Date.now() - newest < QUIET_MS) await page.waitForTimeout(QUIET_MS / 5);
  await context.close();
  return bytes;
}
