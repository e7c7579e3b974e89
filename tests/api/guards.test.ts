import { randomUUID } from "node:crypto";
import { readdirSync, readFileSync } from "node:fs";
import path from "node:path";
import { beforeAll, describe, expect, it } from "vitest";
import { ROLES, can, type Action, type Role } from "@/lib/policy";
import { testDatabase } from "../setup/database";
import { call, cookieOf, problemOf } from "./client";
import { OPEN_ROUTES, TEAM_ROUTES, callOf, type RouteRow } from "./routes";
import { sceneOf } from "./scene";

const NOW = "2026-12-01T08:00:00Z";
process.env.BELLWARD_NOW = NOW;
const { db } = await testDatabase();

const API = path.resolve(import.meta.dirname, "../../app/api");
const name = ({ method, path: route }: RouteRow) => `${method} /api/${route}`;

const handlerOf = async ({ method, path: route }: RouteRow) => {
  const exported = (await import(path.join(API, route, "route.ts"))) as Record<
    string,
    Parameters<typeof call>[0]
  >;
  const handler = exported[method];
  if (!handler) throw new Error(`no ${method} in ${route}`);
  return handler;
};

/** A role that may do it: of the whole team where there is one, else for its own athlete. */
const allowedTo = (may: Action | null): Role =>
  ROLES.find((role) => may === null || can({ role, athleteId: null }, may)) ??
  ROLES.find((role) => may !== null && can({ role, athleteId: "own" }, may, "own")) ??
  "head";

let own: Awaited<ReturnType<typeof sceneOf>>;
let foreign: Awaited<ReturnType<typeof sceneOf>>;
beforeAll(async () => {
  own = await sceneOf(db, new Date(NOW));
  foreign = await sceneOf(db, new Date(NOW));
});

it("no route is missing from these tests", () => {
  const files = readdirSync(API, { recursive: true, encoding: "utf8" })
    .filter((file) => path.basename(file) === "route.ts")
    .map((file) => path.dirname(file));
  const found = files
    .filter((file) => !OPEN_ROUTES.includes(file))
    .flatMap((file) => {
      const source = readFileSync(path.join(API, file, "route.ts"), "utf8");
      return [...source.matchAll(/export (?:const|async function|function) ([A-Z]+)\b/g)].map(
        ([, method]) => `${method} /api/${file}`,
      );
    });
  expect(found.sort()).toEqual(TEAM_ROUTES.map(name).sort());
});

describe.each(TEAM_ROUTES.map((row) => [name(row), row] as const))("%s", (_, row) => {
  it("401 without a session, with a forged one, and with one of nobody", async () => {
    const handler = await handlerOf(row);
    const cookies = [undefined, "next-auth.session-token=forged", await cookieOf(randomUUID())];
    for (const cookie of cookies) {
      const response = await call(handler, { ...callOf(row, own.scene), cookie });
      expect(response.status).toBe(401);
      expect((await problemOf(response)).type).toBe("tag:bellward,2026:unauthenticated");
    }
  });

  const { may } = row;
  const refused = may === null ? [] : ROLES.filter((role) => !can({ role, athleteId: "own" }, may, "own"));
  if (refused.length > 0)
    it(`403 for ${refused.join(", ")}`, async () => {
      const handler = await handlerOf(row);
      for (const role of refused) {
        const response = await call(handler, { ...callOf(row, own.scene), cookie: await own.cookie(role) });
        expect([role, response.status]).toEqual([role, 403]);
        expect((await problemOf(response)).type).toBe("tag:bellward,2026:forbidden");
      }
    });

  if (row.params)
    it("the same 404 for another team's, for nobody's, and for what is no id", async () => {
      const handler = await handlerOf(row);
      const cookie = await own.cookie(allowedTo(may));
      const good = row.params?.(own.scene) ?? {};
      const key = Object.keys(good)[0] ?? "";
      const wrong = [randomUUID(), "../x%00"].map((id) => ({ ...good, [key]: id }));
      const answers = [];
      for (const params of [row.params?.(foreign.scene), ...wrong]) {
        const response = await call(handler, { ...callOf(row, own.scene), cookie, params });
        expect(response.status).toBe(404);
        answers.push(await problemOf(response));
      }
      expect(answers[1]).toEqual(answers[0]);
      expect(answers[2]).toEqual(answers[0]);
    });

  if (row.body)
    it("422 for a body that is no JSON and for one of another shape, with pointers", async () => {
      const handler = await handlerOf(row);
      const cookie = await own.cookie(allowedTo(may));
      const { params } = callOf(row, own.scene);
      for (const raw of ["{", "[]", '{"x":1}', ""]) {
        const response = await call(handler, { method: row.method, cookie, params, raw });
        expect([raw, response.status]).toEqual([raw, 422]);
        const { errors = [] } = await problemOf(response);
        expect(errors.length).toBeGreaterThan(0);
        for (const { pointer, message } of errors) {
          expect(pointer).toMatch(/^(\/.*)?$/);
          expect(message).not.toBe("");
        }
      }
    });

  if (row.body)
    it("413 for a body above 256 KiB, whether or not it says so", async () => {
      const handler = await handlerOf(row);
      const cookie = await own.cookie(allowedTo(may));
      const raw = JSON.stringify({ x: "y".repeat(256 * 1024) });
      for (const headers of [
        {} as Record<string, string>,
        { "content-length": "10" },
        { "content-length": "999999" },
      ]) {
        const response = await call(handler, { method: row.method, cookie, raw, headers });
        expect(response.status).toBe(413);
        await problemOf(response);
      }
    });
});
