import { eq } from "drizzle-orm";
import { describe, expect, it } from "vitest";
import * as route from "@/app/api/unsubscribe/[token]/route";
import { users } from "@/db/schema";
import { unsubscribeToken } from "@/lib/mail/unsubscribe";
import { teamWithEveryRole } from "../factories/team";
import { testDatabase } from "../setup/database";

const { db } = await testDatabase();
const { as } = await teamWithEveryRole(db);
const { userId } = as("athlete");

describe("POST /api/unsubscribe/[token]", () => {
  it("unsubscribes without a session", async () => {
    const token = unsubscribeToken(userId);
    const request = new Request(`http://bellward.test/api/unsubscribe/${token}`, {
      method: "POST",
      body: new URLSearchParams({ "List-Unsubscribe": "One-Click" }),
    });
    const answer = await route.POST(request, { params: Promise.resolve({ token }) });
    expect(answer.status).toBe(200);
    const [user] = await db.select({ choice: users.mailChoice }).from(users).where(eq(users.id, userId));
    expect(user?.choice).toBe("none");
  });

  it("answers no other method: opening the address changes nothing (RFC 8058 section 3.1)", () => {
    // Next answers 405 to what a route does not export.
    expect(Object.keys(route)).toEqual(["POST"]);
  });
});
