import { inRequest } from "./in-request";
import { eq } from "drizzle-orm";
import { NextRequest } from "next/server";
import { beforeEach, describe, expect, it } from "vitest";
import { rateLimits, users } from "@/db/schema";
import { GET, POST } from "@/app/api/auth/[...nextauth]/route";
import { GET as readAccount } from "@/app/api/account/route";
import { LIMITS } from "@/lib/auth/limits";
import { hashPassword } from "@/lib/auth/password";
import { teamWithEveryRole } from "../factories/team";
import { testDatabase } from "../setup/database";
import { call, problemOf } from "./client";

const { db } = await testDatabase();
const PASSWORD = "a long enough passphrase";
const team = await teamWithEveryRole(db);
const head = team.people[0];
if (!head) throw new Error("no head");
await db
  .update(users)
  .set({ passwordHash: await hashPassword(PASSWORD) })
  .where(eq(users.id, head.id));

beforeEach(() => db.delete(rateLimits));

async function auth(action: string, init: RequestInit = {}, address = "203.0.113.1") {
  const request = new NextRequest(`http://bellward.test/api/auth/${action}`, init as never);
  request.headers.set("x-forwarded-for", address);
  const handler = init.method === "POST" ? POST : GET;
  const context = { params: Promise.resolve({ nextauth: action.split("/") }) };
  return inRequest(request, () => handler(request, context));
}

const cookiesOf = (response: Response): string =>
  response.headers
    .getSetCookie()
    .map((cookie) => cookie.split(";")[0])
    .join("; ");

async function signIn(email: string, password: string, address?: string) {
  const csrf = await auth("csrf");
  const { csrfToken } = (await csrf.json()) as { csrfToken: string };
  const body = new URLSearchParams({ email, password, csrfToken, callbackUrl: "/", json: "true" });
  return auth(
    "callback/credentials",
    { method: "POST", body, headers: { cookie: cookiesOf(csrf) } },
    address,
  );
}

const sessionOf = (response: Response): string =>
  cookiesOf(response)
    .split("; ")
    .find((cookie) => cookie.startsWith("next-auth.session-token=")) ?? "";

describe("sign-in", () => {
  it("gives a session that the API takes, in a cookie that scripts cannot read", async () => {
    const response = await signIn(head.email, PASSWORD);
    expect(response.status).toBe(200);
    const [cookie = ""] = response.headers.getSetCookie().filter((one) => one.includes("session-token"));
    expect(cookie).toMatch(/; HttpOnly(;|$)/i);
    expect(cookie).toMatch(/; SameSite=Lax(;|$)/i);
    const account = await call(readAccount, { cookie: sessionOf(response) });
    expect(account.status).toBe(200);
    expect(await account.json()).toMatchObject({ email: head.email });
  });

  it("takes the e-mail in any case, with spaces around it, and the password in another Unicode form", async () => {
    const accented = "caf\u00e9 and long enough";
    await db
      .update(users)
      .set({ passwordHash: await hashPassword(accented) })
      .where(eq(users.email, team.people[1]?.email ?? ""));
    const email = ` ${team.people[1]?.email.toUpperCase()} `;
    expect((await signIn(email, "cafe\u0301 and long enough")).status).toBe(200);
  });

  it("says the same of a wrong password, of an unknown e-mail and of nothing at all", async () => {
    const answers = [];
    for (const [email, password] of [
      [head.email, "not the password"],
      ["nobody@nowhere.example", PASSWORD],
      ["", ""],
      [head.email, "x".repeat(5000)],
    ] as const) {
      const response = await signIn(email, password);
      answers.push([response.status, await response.text(), sessionOf(response)]);
    }
    expect(answers[0]?.[0]).toBe(401);
    expect(new Set(answers.map((answer) => JSON.stringify(answer))).size).toBe(1);
  });

  it("is refused without the form token of the same browser", async () => {
    const body = new URLSearchParams({
      email: head.email,
      password: PASSWORD,
      csrfToken: "forged",
      json: "true",
    });
    const response = await auth("callback/credentials", { method: "POST", body });
    expect(sessionOf(response)).toBe("");
  });

  it("next-auth's own session is empty once the session version is raised", async () => {
    const cookie = sessionOf(await signIn(head.email, PASSWORD));
    const session = async () => (await auth("session", { headers: { cookie } })).json();
    expect(await session()).toHaveProperty("expires");
    await db.update(users).set({ sessionVersion: 2 }).where(eq(users.id, head.id));
    expect(await session()).toEqual({});
    await db.update(users).set({ sessionVersion: 1 }).where(eq(users.id, head.id));
  });
});

describe("the limit on sign-in", () => {
  it("shuts an account after its number of failures, from whatever address, right password or not: 429 with Retry-After", async () => {
    const { points, seconds } = LIMITS["sign-in-account"];
    for (let n = 0; n < points; n++)
      expect((await signIn(head.email, "wrong password", `203.0.113.${n}`)).status).toBe(401);
    const refused = await signIn(head.email.toUpperCase(), PASSWORD, "203.0.113.200");
    expect(refused.status).toBe(429);
    const wait = Number(refused.headers.get("retry-after"));
    expect(wait).toBeGreaterThan(0);
    expect(wait).toBeLessThanOrEqual(seconds);
    expect(sessionOf(refused)).toBe("");
    expect((await problemOf(refused)).type).toBe("tag:bellward,2026:too-many");
  });

  it("shuts an unknown e-mail in the same way: the limit tells nothing either", async () => {
    for (let n = 0; n < LIMITS["sign-in-account"].points; n++)
      await signIn("ghost@nowhere.example", "whatever");
    expect((await signIn("ghost@nowhere.example", "whatever")).status).toBe(429);
  });

  it("shuts an address that tries many accounts, and no other address", async () => {
    const { points } = LIMITS["sign-in-address"];
    await Promise.all(
      Array.from({ length: points }, (_, n) =>
        signIn(`many-${n}@nowhere.example`, "whatever", "198.51.100.7"),
      ),
    );
    expect((await signIn(head.email, PASSWORD, "198.51.100.7")).status).toBe(429);
    expect((await signIn(head.email, PASSWORD, "198.51.100.8")).status).toBe(200);
  });

  it("counts the address that the nearest proxy saw, whatever the caller claims before it", async () => {
    for (let n = 0; n < LIMITS["sign-in-address"].points; n++)
      await signIn(`far-${n}@nowhere.example`, "whatever", `10.0.0.${n}, 198.51.100.9`);
    expect((await signIn(head.email, PASSWORD, "1.1.1.1, 198.51.100.9")).status).toBe(429);
  });

  it("is not used up by signing in rightly", async () => {
    for (let n = 0; n < LIMITS["sign-in-account"].points + 2; n++)
      expect((await signIn(head.email, PASSWORD)).status).toBe(200);
  });

  it("keeps no e-mail and no address in the database", async () => {
    await signIn("trace@nowhere.example", "whatever", "192.0.2.77");
    const rows = JSON.stringify(await db.select().from(rateLimits));
    expect(rows).toContain("sign-in-account");
    expect(rows).not.toMatch(/trace|nowhere|192\.0\.2\.77/);
  });
});
