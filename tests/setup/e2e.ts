import { readFileSync } from "node:fs";
import path from "node:path";

export interface BrowserTestServer {
  /** Without a slash at its end. */
  readonly url: string;
  readonly databaseUrl: string;
  /** Folder of caught mails: <id>.eml and <id>.json, see lib/mail/catcher.mjs. */
  readonly outboxDir: string;
}

/** Folder of one run, told apart by its port: two runs may go on at once. */
export const e2eFolder = (port: string | number) =>
  path.resolve(import.meta.dirname, "../../.data", `e2e-${port}`);

/** The server that this browser test runs against. */
export function browserTestServer(): BrowserTestServer {
  const port = process.env.BELLWARD_E2E_PORT;
  if (!port) throw new Error("Browser tests are run by Playwright: npx playwright test");
  return JSON.parse(readFileSync(path.join(e2eFolder(port), "server.json"), "utf8"));
}
