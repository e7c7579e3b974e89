import { spawn } from "node:child_process";
import { once } from "node:events";
import { mkdtemp, readdir, rm, writeFile } from "node:fs/promises";
import { createConnection } from "node:net";
import { tmpdir } from "node:os";
import path from "node:path";
import { createTransport } from "nodemailer";
import { afterAll, describe, expect, it } from "vitest";
import { listCaught, readCaught } from "@/lib/mail/outbox";

const root = await mkdtemp(path.join(tmpdir(), "bellward-outbox-"));
const dir = path.join(root, "outbox");
afterAll(() => rm(root, { recursive: true, force: true }));

const start = (env: Record<string, string>) =>
  spawn(process.execPath, ["lib/mail/catcher.mjs"], {
    env: { ...process.env, ...env },
    stdio: ["ignore", "pipe", "pipe"],
  });

describe("the mail catcher", () => {
  it("says its port, keeps a mail as it came, and ends cleanly when asked", async () => {
    const child = start({ CATCHER_DIR: dir, CATCHER_PORT: "0" });
    const [line] = (await once(child.stdout, "data")) as [Buffer];
    const { port } = JSON.parse(line.toString()) as { port: number };
    const transport = createTransport({ host: "127.0.0.1", port });
    await transport.sendMail({
      from: "camp@gym.example",
      to: "ines@gym.example",
      subject: "Novi put čćžšđ",
      text: "See http://bellward.test/reset/abc and http://bellward.test/reset/abc",
      html: "<p>See <b>this</b></p>",
      headers: { "X-Long": `${"word ".repeat(40)}end` },
    });
    await transport.sendMail({
      from: "camp@gym.example",
      to: "ines@gym.example",
      subject: "Second",
      text: "Only text",
    });
    child.kill("SIGTERM");
    expect(await once(child, "exit")).toEqual([0, null]);

    const [newest, oldest] = await listCaught(dir);
    expect([newest?.subject, oldest?.subject]).toEqual(["Second", "Novi put čćžšđ"]);
    const mail = await readCaught(dir, oldest?.id ?? "");
    expect(mail?.links).toEqual(["http://bellward.test/reset/abc"]);
    expect(mail?.html).toBe("<p>See <b>this</b></p>");
    expect(mail?.headers).toContainEqual({ name: "X-Long", value: `${"word ".repeat(40)}end` });
    expect((await readCaught(dir, newest?.id ?? ""))?.html).toBeNull();
  });

  it("is not reached from outside of the machine", async () => {
    const child = start({ CATCHER_DIR: dir, CATCHER_PORT: "0" });
    const [line] = (await once(child.stdout, "data")) as [Buffer];
    const { port } = JSON.parse(line.toString()) as { port: number };
    // 127.0.0.2 is another address of this machine, as a network card's would be.
    const socket = createConnection({ host: "127.0.0.2", port });
    const [error] = (await once(socket, "error")) as [NodeJS.ErrnoException];
    expect(error.code).toBe("ECONNREFUSED");
    child.kill("SIGTERM");
    await once(child, "exit");
  });

  it("started wrongly says so in one line and ends with a code", async () => {
    const child = start({ CATCHER_DIR: "", CATCHER_PORT: "0" });
    const [said] = (await once(child.stderr, "data")) as [Buffer];
    expect(said.toString().trim().split("\n")).toHaveLength(1);
    expect(await once(child, "exit")).toEqual([2, null]);
  });
});

describe("reading the outbox", () => {
  it("never leaves its folder", async () => {
    await writeFile(path.join(root, "1-aaaaaaaa.json"), "{}");
    for (const id of ["../1-aaaaaaaa", "..%2f1-aaaaaaaa", "/etc/passwd", ""])
      expect(await readCaught(dir, id)).toBeNull();
  });

  it("skips what is no mail of the catcher's", async () => {
    const before = (await listCaught(dir)).length;
    await writeFile(path.join(dir, "1-bbbbbbbb.json"), "not json");
    await writeFile(path.join(dir, "1-cccccccc.json"), '{"id":"../../etc"}');
    expect(await readdir(dir)).toContain("1-bbbbbbbb.json");
    expect(await listCaught(dir)).toHaveLength(before);
  });

  it("is empty where there is no folder yet", async () => {
    expect(await listCaught(path.join(root, "nowhere"))).toEqual([]);
  });
});
