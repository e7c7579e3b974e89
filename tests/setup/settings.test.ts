import { readFileSync } from "node:fs";
import { describe, expect, it, vi } from "vitest";
import { now } from "@/lib/clock";
import { parseEnv } from "@/lib/env";

const GOOD = {
  DATABASE_URL: "postgres://u:p@db.example:5432/bellward",
  SMTP_URL: "smtp://mail.example:587",
  MAIL_FROM: "Bellward <camp@example.org>",
  NEXTAUTH_SECRET: "x".repeat(32),
  NEXTAUTH_URL: "https://camp.example.org/",
};

describe("settings", () => {
  it("links use the server's address, without a slash at its end, unless told otherwise", () => {
    expect(parseEnv(GOOD).APP_URL).toBe("https://camp.example.org");
    expect(parseEnv({ ...GOOD, APP_URL: "https://links.example.org" }).APP_URL).toBe(
      "https://links.example.org",
    );
  });

  it("an empty value counts as not set", () => {
    expect(parseEnv({ ...GOOD, BELLWARD_OUTBOX_DIR: "", PLAN_RATE_PER_MINUTE: "" })).toMatchObject({
      PLAN_RATE_PER_MINUTE: 60,
    });
    expect(() => parseEnv({ ...GOOD, MAIL_FROM: "" })).toThrow(/MAIL_FROM/);
  });

  it("each has its place in .env.example", () => {
    const schema = readFileSync("lib/env.ts", "utf8");
    const example = readFileSync(".env.example", "utf8");
    const names = [...schema.matchAll(/^ {4}([A-Z_]+): /gm)].map(([, name]) => name ?? "");
    expect(names).toContain("DATABASE_URL");
    // NODE_ENV is set by the commands, never by hand.
    expect(names.filter((name) => name !== "NODE_ENV" && !example.includes(`\n${name}=`))).toEqual([]);
  });

  it("one message names everything that is wrong", () => {
    expect(() => parseEnv({ DATABASE_URL: "mysql://db", NEXTAUTH_SECRET: "short" })).toThrow(
      /DATABASE_URL.*SMTP_URL.*MAIL_FROM.*NEXTAUTH_SECRET.*NEXTAUTH_URL/s,
    );
  });
});

describe("the clock", () => {
  const FROM = "2026-03-29T00:30:00Z";
  const nearFrom = () => Math.abs(now().getTime() - Date.parse(FROM)) < 60_000;

  it("can be moved in development and tests", () => {
    vi.stubEnv("BELLWARD_NOW", FROM);
    expect(nearFrom()).toBe(true);
  });

  it("cannot be moved in production, but for the build under test", () => {
    vi.stubEnv("BELLWARD_NOW", FROM);
    vi.stubEnv("NODE_ENV", "production");
    vi.stubEnv("BELLWARD_TEST", "0");
    expect(nearFrom()).toBe(false);
    vi.stubEnv("BELLWARD_TEST", "1");
    expect(nearFrom()).toBe(true);
  });

  it("an instant that is none is refused, not read as now", () => {
    vi.stubEnv("BELLWARD_NOW", "tomorrow");
    expect(() => now()).toThrow(/BELLWARD_NOW/);
  });
});
