import { readFileSync, rmSync, statSync } from "node:fs";
import path from "node:path";
import postgres from "postgres";
import { afterAll, describe, expect, it } from "vitest";
import { clusterRuns, clusterUrl, removeCluster, startCluster, stopCluster } from "@/db/server.mjs";

const dir = path.resolve(".data", `test-server-${process.pid}`);
const pidOf = () => Number(readFileSync(path.join(dir, "data", "postmaster.pid"), "utf8").split("\n")[0]);

async function ask<T>(url: string, question: (sql: postgres.Sql) => Promise<T>): Promise<T> {
  const sql = postgres(url, { max: 1, onnotice: () => undefined });
  return question(sql).finally(() => sql.end());
}

afterAll(async () => {
  await removeCluster({ dir });
  rmSync(dir, { recursive: true, force: true });
});

describe("the local PostgreSQL", () => {
  it("is made once, though two start it at the same time, and never on 5432", async () => {
    const [one, two] = await Promise.all([
      startCluster({ dir, fast: true }),
      startCluster({ dir, fast: true }),
    ]);
    expect(two.url).toBe(one.url);
    expect([one.started, two.started].filter(Boolean)).toHaveLength(1);
    expect(one.port).not.toBe(5432);
  });

  it("runs in UTC, in Unicode, and listens on loopback alone", async () => {
    const [row] = await ask(
      clusterUrl({ dir }) ?? "",
      (sql) => sql`
      select current_setting('timezone') as zone, current_setting('server_encoding') as encoding,
             current_setting('listen_addresses') as addresses, current_setting('unix_socket_directories') as sockets`,
    );
    expect(row).toEqual({ zone: "UTC", encoding: "UTF8", addresses: "127.0.0.1", sockets: "" });
  });

  it("lets nobody in without its password, which only the owner can read", async () => {
    const wrong = new URL(clusterUrl({ dir }) ?? "");
    wrong.password = "guess";
    await expect(ask(wrong.href, (sql) => sql`select 1`)).rejects.toThrow(/password authentication failed/);
    expect(statSync(path.join(dir, "state.json")).mode & 0o777).toBe(0o600);
  });

  it("keeps its data and its address over a stop, a kill and a start", async () => {
    const url = clusterUrl({ dir }) ?? "";
    await ask(url, (sql) => sql`create table kept as select 7 as n`);
    expect(await stopCluster({ dir })).toBe(true);
    expect(clusterRuns({ dir })).toBe(false);
    await startCluster({ dir });
    await ask(url, (sql) => sql`checkpoint`);
    process.kill(pidOf(), "SIGKILL");
    await expect.poll(() => clusterRuns({ dir })).toBe(false);
    const again = await startCluster({ dir });
    expect(again.url).toBe(url);
    expect(await ask(again.url, (sql) => sql`select n from kept`)).toEqual([{ n: 7 }]);
  });

  it("says in one line that it is damaged, and can be thrown away and made anew", async () => {
    await stopCluster({ dir });
    rmSync(path.join(dir, "data", "PG_VERSION"));
    await expect(startCluster({ dir })).rejects.toThrow(/is damaged.*db:reset/);
    await removeCluster({ dir });
    await startCluster({ dir, fast: true });
    const tables = await ask(
      clusterUrl({ dir }) ?? "",
      (sql) => sql`select 1 from pg_tables where tablename = 'kept'`,
    );
    expect(tables).toHaveLength(0);
  });
});
