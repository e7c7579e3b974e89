import { expect, it } from "vitest";
import { GET, HEAD } from "@/app/feeds/[token]/calendar.ics/route";
import { createCamp } from "@/lib/services/camps/create";
import { createFeed, revokeFeed } from "@/lib/services/feeds/manage";
import { campForm } from "../factories/camp-book";
import { teamWithEveryRole } from "../factories/team";
import { testDatabase } from "../setup/database";

const { db } = await testDatabase();
const team = await teamWithEveryRole(db, new Date());
await createCamp(
  { ...team.as("head"), now: new Date("2026-11-26T12:00:00Z") },
  { body: campForm({ athlete: { id: team.athlete.id } }) },
);

async function subscribe() {
  const { feed, address } = await createFeed(team.as("athlete"), {
    body: { scope: "athlete", athleteId: team.athlete.id, discreet: false },
  });
  return { id: feed.id, address, token: new URL(address).pathname.split("/")[2] ?? "" };
}

const ask = (token: string, headers: Record<string, string> = {}, method: "GET" | "HEAD" = "GET") =>
  (method === "HEAD" ? HEAD : GET)(
    new Request(`http://bellward.test/feeds/${token}/calendar.ics`, { method, headers }),
    {
      params: Promise.resolve({ token }),
    },
  );

const { token } = await subscribe();

it("answers a calendar that no shared cache may keep, with a strong tag", async () => {
  const response = await ask(token);
  expect(response.status).toBe(200);
  expect(response.headers.get("content-type")).toBe("text/calendar; charset=utf-8");
  expect(response.headers.get("cache-control")).toBe("private");
  expect(response.headers.get("etag")).toMatch(/^"[\w-]+"$/);
  expect((await response.text()).startsWith("BEGIN:VCALENDAR\r\n")).toBe(true);
});

it("answers the same tag and bytes to the next who ask", async () => {
  const [first, second] = [await ask(token), await ask(token)];
  expect(second.headers.get("etag")).toBe(first.headers.get("etag"));
  expect(await second.text()).toBe(await first.text());
});

// Source: RFC 9110, sections 13.1.2, 13.1.3 and 15.4.5; `TAG` stands for the current tag.
it.each([
  ["TAG", 304],
  ["W/TAG", 304],
  ['"x", TAG', 304],
  ["*", 304],
  ['"x"', 200],
])("If-None-Match: %s is answered %i, to GET and HEAD alike", async (header, status) => {
  const tag = (await ask(token)).headers.get("etag") ?? "";
  const headers = {
    "if-none-match": header.replace("TAG", tag),
    "if-modified-since": new Date(Date.now() + 1000).toUTCString(),
  };
  for (const method of ["GET", "HEAD"] as const) {
    const response = await ask(token, headers, method);
    expect(response.status).toBe(status);
    expect(response.headers.get("etag")).toBe(tag);
    expect(response.headers.get("cache-control")).toBe("private");
    if (status === 304 || method === "HEAD") expect(await response.text()).toBe("");
  }
});

it("is case-sensitive about tags", async () => {
  const tag = (await ask(token)).headers.get("etag") ?? "";
  const swapped = tag.replace(/[a-z]/gi, (letter) =>
    letter === letter.toLowerCase() ? letter.toUpperCase() : letter.toLowerCase(),
  );
  expect((await ask(token, { "if-none-match": swapped })).status).toBe(200);
});

it("answers HEAD with the headers of GET and nothing else", async () => {
  const [get, head] = [await ask(token), await ask(token, {}, "HEAD")];
  expect(Object.fromEntries(head.headers)).toEqual(Object.fromEntries(get.headers));
  expect(await head.text()).toBe("");
});

it("answers 404 problem details to what is no address, was never one and is one no more, all alike", async () => {
  const ended = await subscribe();
  await revokeFeed(team.as("athlete"), { params: { id: ended.id } });
  const answers = await Promise.all(
    ["x", "a".repeat(43), ended.token].map(async (secret) => {
      const response = await ask(secret, { "if-none-match": "*" });
      return {
        status: response.status,
        type: response.headers.get("content-type"),
        body: await response.text(),
      };
    }),
  );
  expect(answers[0]).toMatchObject({ status: 404, type: "application/problem+json" });
  expect(new Set(answers.map((answer) => JSON.stringify(answer))).size).toBe(1);
});

it("builds the address from the server's own, whatever host was asked", async () => {
  expect((await subscribe()).address).toMatch(/^http:\/\/bellward\.test\/feeds\/[\w-]{43}\/calendar\.ics$/);
});
