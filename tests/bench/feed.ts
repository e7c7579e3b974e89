import { Agent, request } from "node:http";
import { performance } from "node:perf_hooks";
import { eq } from "drizzle-orm";
import { openDatabase } from "@/db/client";
import { camps, memberships, users } from "@/db/schema";
import { createFeed } from "@/lib/services/feeds/manage";
import { figures, round } from "./measure";

const CONNECTIONS = 8;
const REQUESTS = 2000;
const BODIES = 200;

interface Answer {
  readonly status: number;
  readonly etag: string;
}

function ask(agent: Agent, address: string, headers: Record<string, string> = {}): Promise<Answer> {
  return new Promise((resolve, reject) => {
    const call = request(address, { agent, headers }, (response) => {
      response.resume();
      response.on("end", () =>
        resolve({ status: response.statusCode ?? 0, etag: String(response.headers.etag ?? "") }),
      );
    });
    call.on("error", reject);
    call.end();
  });
}

/** Requests a second over a fixed number of connections; every answer must have the status that is expected. */
async function rate(address: string, status: number, headers: Record<string, string> = {}): Promise<number> {
  const agent = new Agent({ keepAlive: true, maxSockets: CONNECTIONS });
  const run = async (count: number) => {
    let left = count;
    const worker = async () => {
      while (left-- > 0) {
        const answer = await ask(agent, address, headers);
        if (answer.status !== status) throw new Error(`${address}: ${answer.status} instead of ${status}`);
      }
    };
    await Promise.all(Array.from({ length: CONNECTIONS }, worker));
  };
  await run(200);
  const start = performance.now();
  await run(REQUESTS);
  agent.destroy();
  return (REQUESTS * 1000) / (performance.now() - start);
}

/** A feed of the demo's 12-week camp: unchanged answers beside an empty route of the same server, and full bodies. */
export async function benchFeed(url: string, databaseUrl: string) {
  const { db, sql } = openDatabase(databaseUrl, { max: 2 });
  const [camp] = await db.select().from(camps).where(eq(camps.weeks, 12));
  const [head] = await db
    .select({ userId: users.id, teamId: memberships.teamId })
    .from(users)
    .innerJoin(memberships, eq(memberships.userId, users.id))
    .where(eq(memberships.role, "head"));
  if (!camp || !head) throw new Error("The demo has no 12-week camp.");
  const ctx = { db, ...head, member: { role: "head", athleteId: null } as const, now: new Date() };
  const { address } = await createFeed(ctx, {
    body: { scope: "athlete", athleteId: camp.athleteId, discreet: false },
  });
  await sql.end();
  const feed = `${url}${new URL(address).pathname}`;
  const agent = new Agent({ keepAlive: true, maxSockets: 1 });
  const { etag } = await ask(agent, feed);
  const times: number[] = [];
  for (let run = 0; run < BODIES + 20; run++) {
    const start = performance.now();
    await ask(agent, feed);
    if (run >= 20) times.push(performance.now() - start);
  }
  agent.destroy();
  // In turns, so that a machine that slows down slows both.
  const ratios: number[] = [];
  for (let turn = 0; turn < 3; turn++) {
    const empty = await rate(`${url}/api/live`, 204);
    const unchanged = await rate(feed, 304, { "if-none-match": etag });
    ratios.push(unchanged / empty);
  }
  const body = figures(times);
  return {
    "304 rate over empty route, ratio": round(figures(ratios).median),
    "full body, ms": { median: round(body.median), p95: round(body.p95), runs: body.runs },
  };
}
