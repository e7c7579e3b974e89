import { eq } from "drizzle-orm";
import { describe, expect, it } from "vitest";
import { users } from "@/db/schema";
import { oneClickUnsubscribe } from "@/lib/mail/one-click";
import { readUnsubscribeToken, unsubscribeToken } from "@/lib/mail/unsubscribe";
import { teamWithEveryRole } from "../factories/team";
import { testDatabase } from "../setup/database";

const { db } = await testDatabase();
const { as } = await teamWithEveryRole(db);
const { userId } = as("athlete");
const other = as("head").userId;

const address = (token: string) => `http://bellward.test/api/unsubscribe/${token}`;
const urlencoded = (body: string) => ({
  method: "POST",
  body,
  headers: { "Content-Type": "application/x-www-form-urlencoded" },
});
const multipart = () => {
  const body = new FormData();
  body.set("List-Unsubscribe", "One-Click");
  return { method: "POST", body };
};
const choiceOf = async (id: string) => (await db.select().from(users).where(eq(users.id, id)))[0]?.mailChoice;
const reset = () => db.update(users).set({ mailChoice: "each" });
const post = (token: string, init: RequestInit) =>
  oneClickUnsubscribe(db, token, new Request(address(token), init));

describe("one click (RFC 8058 section 3.2)", () => {
  it.each([
    ["urlencoded", urlencoded("List-Unsubscribe=One-Click")],
    ["multipart", multipart()],
  ])("stops mail of the person that the address names, and of nobody else: %s", async (_name, init) => {
    await reset();
    const answer = await post(unsubscribeToken(userId), init);
    // "MUST NOT return an HTTPS redirect": section 3.1.
    expect(answer.status).toBe(200);
    expect(await choiceOf(userId)).toBe("none");
    expect(await choiceOf(other)).toBe("each");
  });

  it("is harmless twice", async () => {
    await post(unsubscribeToken(userId), multipart());
    expect((await post(unsubscribeToken(userId), multipart())).status).toBe(200);
  });

  it.each([
    ["another body", urlencoded("hello=there")],
    ["no body", { method: "POST" }],
    ["a body that has no end", urlencoded(`List-Unsubscribe=One-Click&more=${"x".repeat(5000)}`)],
    [
      "JSON",
      {
        method: "POST",
        body: '{"List-Unsubscribe":"One-Click"}',
        headers: { "Content-Type": "application/json" },
      },
    ],
  ])("changes nothing with %s", async (_name, init) => {
    await reset();
    expect((await post(unsubscribeToken(userId), init)).status).toBe(400);
    expect(await choiceOf(userId)).toBe("each");
  });
});

describe("the token", () => {
  it("names its person", () => {
    expect(readUnsubscribeToken(unsubscribeToken(userId))).toBe(userId);
  });

  it("cannot be turned into another person's, cut or forged", async () => {
    await reset();
    const mine = Buffer.from(unsubscribeToken(userId), "base64url");
    const theirs = Buffer.concat([Buffer.from(other.replaceAll("-", ""), "hex"), mine.subarray(16)]);
    const bad = [
      theirs.toString("base64url"),
      unsubscribeToken(userId).slice(0, -1),
      "",
      "x",
      "A".repeat(64),
    ];
    for (const token of bad) {
      expect(readUnsubscribeToken(token)).toBeNull();
      expect((await post(token, multipart())).status).toBe(404);
    }
    expect(await choiceOf(other)).toBe("each");
  });
});
