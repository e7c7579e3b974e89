import {
  expect,
  request,
  type APIRequestContext,
  type Browser,
  type BrowserContext,
  type BrowserContextOptions,
  type Page,
} from "@playwright/test";
import type { Role } from "@/lib/policy";
import { browserTestServer } from "../setup/e2e";
import demo from "../../db/seed/accounts.json" with { type: "json" };

/** Signs in without the form; `context` then holds the session, and with it every page of a browser context. */
export async function signInBy(context: APIRequestContext, email: string, password: string): Promise<void> {
  const { csrfToken } = (await (await context.get("/api/auth/csrf")).json()) as { csrfToken: string };
  const answer = await context.post("/api/auth/callback/credentials", {
    form: { csrfToken, email, password, json: "true" },
  });
  expect(answer.status()).toBe(200);
}

type Stored = Awaited<ReturnType<BrowserContext["storageState"]>>;

async function signInOnce(role: Role): Promise<Stored> {
  const account = demo.accounts.find((candidate) => candidate.role === role);
  if (!account) throw new Error(`There is no demo account for ${role}.`);
  const context = await request.newContext({ baseURL: browserTestServer().url });
  await signInBy(context, account.email, demo.password);
  const stored = await context.storageState();
  await context.dispose();
  return stored;
}

const sessions = new Map<Role, Promise<Stored>>();

/** The session of a demo account; each is signed in once a worker. */
export function demoSession(role: Role): Promise<Stored> {
  const known = sessions.get(role) ?? signInOnce(role);
  sessions.set(role, known);
  return known;
}

/** A page of a demo account, in a context of its own that the caller closes. */
export async function demoPage(
  browser: Browser,
  role: Role,
  options: BrowserContextOptions = {},
): Promise<Page> {
  const context = await browser.newContext({ ...options, storageState: await demoSession(role) });
  return context.newPage();
}

/** What the API answers to a session. */
export async function apiStatus(
  context: APIRequestContext,
  method: string,
  path: string,
  body?: unknown,
): Promise<number> {
  const answer = await context.fetch(path, { method, ...(body !== undefined && { data: body }) });
  return answer.status();
}
