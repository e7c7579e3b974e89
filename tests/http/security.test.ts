import { NextRequest } from "next/server";
import { describe, expect, it, vi } from "vitest";
import { safeNext, signInAddress } from "@/lib/auth/next-path";
import { AppError, ERROR_CODES } from "@/lib/errors";
import { problemResponse } from "@/lib/http/problem";
import { isForeignCall } from "@/lib/http/same-origin";
import { logger } from "@/lib/logger";
import { proxy } from "@/proxy";
import { cookieOf } from "../api/client";

describe("where sign-in leads to", () => {
  it.each([
    ["/camps/5?session=a%40b#x", "/camps/5?session=a%40b#x"],
    ["/", "/"],
    [null, "/board"],
    ["", "/board"],
    ["https://elsewhere.example/", "/board"],
    ["//elsewhere.example", "/board"],
    ["/\\elsewhere.example", "/board"],
    ["/\t/elsewhere.example", "/board"],
    ["/a\\..\\\\elsewhere.example", "/board"],
    ["/\n/elsewhere.example", "/board"],
    ["javascript:alert(1)", "/board"],
    ["board", "/board"],
  ])("%j leads to %j", (given, expected) => {
    expect(safeNext(given)).toBe(expected);
    // As a browser reads it: the same site, whatever was given.
    expect(new URL(safeNext(given), "http://bellward.test").origin).toBe("http://bellward.test");
  });

  it("the way back survives in the address", () => {
    const address = new URL(signInAddress("/camps/5?session=a&x=1"), "http://bellward.test");
    expect(address.searchParams.get("next")).toBe("/camps/5?session=a&x=1");
  });
});

describe("calls from other sites", () => {
  const OWN = ["https://bellward.test"];
  const ask = (method: string, path: string, headers: Record<string, string>) =>
    isForeignCall(new Request(`https://bellward.test${path}`, { method, headers }), OWN);

  it.each([
    ["POST", "/api/camps", { "sec-fetch-site": "cross-site" }, true],
    ["POST", "/api/camps", { "sec-fetch-site": "same-site" }, true],
    ["POST", "/api/camps", { "sec-fetch-site": "same-origin" }, false],
    ["POST", "/api/camps", { "sec-fetch-site": "none" }, false],
    ["DELETE", "/api/feeds/1", { "sec-fetch-site": "cross-site" }, true],
    ["PUT", "/api/account", { origin: "https://elsewhere.example" }, true],
    ["PUT", "/api/account", { origin: "null" }, true],
    ["PUT", "/api/account", { origin: "https://bellward.test.elsewhere.example" }, true],
    ["PUT", "/api/account", { origin: "https://bellward.test" }, false],
    ["PUT", "/api/account", { origin: "http://bellward.test" }, true],
    ["PUT", "/api/account", { origin: "https://inside:3000", host: "inside:3000" }, false],
    ["POST", "/api/auth/callback/credentials", { "sec-fetch-site": "cross-site" }, true],
    ["POST", "/api/camps", {}, false],
    ["GET", "/api/camps", { "sec-fetch-site": "cross-site" }, false],
    ["POST", "/api/plan", { "sec-fetch-site": "cross-site" }, false],
    ["POST", "/api/planner", { "sec-fetch-site": "cross-site" }, true],
    ["POST", "/api/unsubscribe/x.y", { origin: "https://mail.example" }, false],
  ])("%s %s with %j is foreign: %s", (method, path, headers, foreign) => {
    expect(ask(method, path, headers as Record<string, string>)).toBe(foreign);
  });
});

describe("problem details (RFC 9457)", () => {
  it("every code has a client error's status and its own type", async () => {
    const types = new Set<string>();
    for (const code of ERROR_CODES) {
      const response = problemResponse(new AppError(code, "Words for a person."));
      const body = (await response.json()) as { type: string; status: number; detail: string };
      expect(response.status).toBeGreaterThanOrEqual(400);
      expect(response.status).toBeLessThan(500);
      expect(body).toMatchObject({ status: response.status, detail: "Words for a person." });
      expect(new URL(body.type).protocol).toBe("tag:");
      types.add(body.type);
    }
    expect(types.size).toBe(ERROR_CODES.length);
  });

  it("an unexpected error is logged and says nothing of the inside", async () => {
    const logged = vi.spyOn(logger, "error").mockImplementation(() => undefined);
    const response = problemResponse(new Error("password of postgres is hunter2"));
    expect(response.status).toBe(500);
    expect(await response.text()).not.toContain("hunter2");
    expect(logged).toHaveBeenCalledOnce();
  });

  it("a refusal's cause stays inside", async () => {
    const error = new AppError("conflict", "Taken.", {}, new Error("secret cause"));
    expect(await problemResponse(error).text()).not.toContain("secret cause");
  });
});

describe("what stands before every page", () => {
  const open = (path: string, headers: Record<string, string> = {}) =>
    proxy(new NextRequest(`http://bellward.test${path}`, { headers }));

  it.each(["/board", "/camps/5?session=a", "/athletes", "/settings", "/house-rules", "/timetable"])(
    "%s leads a stranger to the sign-in and back",
    async (path) => {
      const response = await open(path);
      expect(response.status).toBe(307);
      const to = new URL(response.headers.get("location") ?? "");
      expect([to.pathname, to.searchParams.get("next")]).toEqual(["/sign-in", path]);
    },
  );

  it("a forged session is no session", async () => {
    const response = await open("/board", { cookie: "next-auth.session-token=eyJhbGciOiJub25lIn0.e30." });
    expect(response.status).toBe(307);
  });

  it.each(["/", "/how", "/sign-in", "/boardroom", "/reset/x"])("%s is open to anyone", async (path) => {
    expect((await open(path)).status).toBe(200);
  });

  it("each page has a policy with a nonce of its own, and no script without it", async () => {
    const cookie = await cookieOf("5d1f0a52-6f0e-4b57-9a55-0c7f3a1f7b99");
    const policies = await Promise.all(
      ["/board", "/board"].map(async (path) =>
        (await open(path, { cookie })).headers.get("content-security-policy"),
      ),
    );
    const [first = "", second = ""] = policies.map((policy) => policy ?? "");
    expect(first).not.toBe(second);
    const scripts = first.split("; ").find((rule) => rule.startsWith("script-src"));
    expect(scripts).toMatch(/^script-src 'self' 'nonce-[A-Za-z0-9+/=]{24}' 'strict-dynamic'$/);
    for (const rule of [
      "frame-ancestors 'none'",
      "object-src 'none'",
      "base-uri 'none'",
      "form-action 'self'",
    ])
      expect(first.split("; ")).toContain(rule);
  });

  it("a call from another site is 403 before any route sees it", async () => {
    const request = new NextRequest("http://bellward.test/api/account", {
      method: "PUT",
      headers: { "sec-fetch-site": "cross-site" },
      body: "{}",
    });
    const response = await proxy(request);
    expect([response.status, response.headers.get("content-type")]).toEqual([
      403,
      "application/problem+json",
    ]);
  });
});
