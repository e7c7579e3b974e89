import { eq } from "drizzle-orm";
import { SMTPServer } from "smtp-server";
import { beforeEach, describe, expect, it } from "vitest";
import { mails } from "@/db/schema";
import { queueMail, type OutgoingMail } from "@/lib/mail/queue";
import { waitAfter } from "@/lib/mail/send";
import { sweep } from "@/lib/mail/tasks";
import { testDatabase } from "../setup/database";
import { mailDeps, mailbox, makeJobsDue, runDueJobs, waitingJobs } from "./mailbox";

const database = await testDatabase();
const { db, sql, url } = database;
const box = await mailbox();
const deps = mailDeps(database, box.url);

let serial = 0;
const letter = (over: Partial<OutgoingMail> = {}): OutgoingMail => ({
  key: `letter-${++serial}`,
  kind: "test",
  to: "ines@gym.example",
  subject: `Letter ${serial}`,
  text: "As text.",
  html: "<p>As HTML.</p>",
  ...over,
});
const rowOf = async (key: string) => (await db.select().from(mails).where(eq(mails.key, key)))[0];
const subjects = async () => (await box.caught()).map(({ mail }) => mail.subject);

beforeEach(async () => {
  await sql`delete from graphile_worker._private_jobs`;
  await sql`delete from mails`;
});

describe("a queued mail", () => {
  it("goes out once, with a Message-ID and a Date of its own row", async () => {
    const mail = letter();
    await db.transaction((tx) => queueMail(tx, mail));
    await runDueJobs(url, deps);
    await makeJobsDue(database);
    await runDueJobs(url, deps);
    const caught = (await box.caught()).filter(({ mail: one }) => one.subject === mail.subject);
    const row = await rowOf(mail.key);
    expect(caught).toHaveLength(1);
    expect(row).toMatchObject({ status: "sent", attempts: 1 });
    expect(caught[0]?.mail.messageId).toBe(row?.messageId);
    expect(caught[0]?.mail.date?.getTime()).toBe(Math.floor((row?.createdAt.getTime() ?? 0) / 1000) * 1000);
    expect(caught[0]?.envelope).toEqual({ from: "camp@bellward.test", to: ["ines@gym.example"] });
  });

  it("is one mail per key, however often it is queued", async () => {
    const mail = letter({ key: "same" });
    await db.transaction((tx) => queueMail(tx, mail));
    expect(await db.transaction((tx) => queueMail(tx, mail))).toBeNull();
    expect(await waitingJobs(database)).toHaveLength(1);
    await runDueJobs(url, deps);
    expect((await subjects()).filter((subject) => subject === mail.subject)).toHaveLength(1);
  });

  it("is not there when its transaction does not commit", async () => {
    const mail = letter();
    await expect(
      db.transaction(async (tx) => {
        await queueMail(tx, mail);
        throw new Error("rolled back");
      }),
    ).rejects.toThrow("rolled back");
    expect(await rowOf(mail.key)).toBeUndefined();
    expect(await waitingJobs(database)).toHaveLength(0);
  });
});

describe("a mail that was sent", () => {
  it("leaves no content behind: its links may be keys", async () => {
    const mail = letter({
      text: "http://bellward.test/reset/secret",
      html: "<p>http://bellward.test/reset/secret</p>",
    });
    await db.transaction((tx) => queueMail(tx, mail));
    await runDueJobs(url, deps);
    expect(await rowOf(mail.key)).toMatchObject({
      status: "sent",
      subject: mail.subject,
      text: "",
      html: "",
      headers: {},
    });
    const jobs = await sql`select payload::text from graphile_worker._private_jobs`;
    expect(JSON.stringify(jobs)).not.toContain("secret");
  });
});

describe("a mail server that is down", () => {
  it("delays mail with a backoff and loses none: it goes out when the server is back", async () => {
    const mail = letter();
    await box.stop();
    await db.transaction((tx) => queueMail(tx, mail));
    await runDueJobs(url, deps);
    expect(await rowOf(mail.key)).toMatchObject({ status: "waiting", attempts: 1 });
    const [first] = await waitingJobs(database);
    expect(first?.seconds).toBeGreaterThan(1);
    expect(first?.seconds).toBeLessThan(waitAfter(1));
    await makeJobsDue(database);
    await runDueJobs(url, deps);
    const [second, ...more] = await waitingJobs(database);
    expect(more).toEqual([]);
    expect(second?.seconds).toBeGreaterThan(waitAfter(1));
    expect(second?.seconds).toBeLessThan(waitAfter(2));
    await box.restart();
    await makeJobsDue(database);
    await runDueJobs(url, deps);
    expect(await rowOf(mail.key)).toMatchObject({ status: "sent", attempts: 3 });
    expect((await subjects()).filter((subject) => subject === mail.subject)).toHaveLength(1);
  });

  it("refuses an address for good: the mail is failed and not tried again", async () => {
    const server = new SMTPServer({
      authOptional: true,
      disabledCommands: ["AUTH", "STARTTLS"],
      onRcptTo: (_address, _session, done) =>
        done(Object.assign(new Error("No such user"), { responseCode: 550 })),
    });
    await new Promise<void>((resolve) => server.listen(0, "127.0.0.1", resolve));
    const address = server.server.address();
    const port = typeof address === "object" && address ? address.port : 0;
    const mail = letter();
    await db.transaction((tx) => queueMail(tx, mail));
    await runDueJobs(url, mailDeps(database, `smtp://127.0.0.1:${port}`));
    await new Promise<void>((resolve) => server.close(() => resolve()));
    expect(await rowOf(mail.key)).toMatchObject({ status: "failed", attempts: 1 });
    expect(await waitingJobs(database)).toHaveLength(0);
  });

  it("that stays down is tried every half hour at least, and given up after five days (RFC 5321 4.5.4.1)", async () => {
    expect([1, 2, 5, 8, 240].map((tries) => Math.round(waitAfter(tries)))).toEqual([3, 7, 148, 1800, 1800]);
    const mail = letter();
    const away = mailDeps(database, "smtp://127.0.0.1:9");
    await db.transaction((tx) => queueMail(tx, mail));
    await sql`update mails set created_at = now() - interval '119 hours'`;
    await runDueJobs(url, away);
    expect(await rowOf(mail.key)).toMatchObject({ status: "waiting" });
    await sql`update mails set created_at = now() - interval '121 hours'`;
    await makeJobsDue(database);
    await runDueJobs(url, away);
    expect(await rowOf(mail.key)).toMatchObject({ status: "failed", attempts: 2 });
    expect(await waitingJobs(database)).toHaveLength(0);
  });
});

describe("several processes on one database", () => {
  it("send a mail once although its job runs in each of them", async () => {
    const mail = letter();
    const id = await db.transaction((tx) => queueMail(tx, mail));
    await sql`select graphile_worker.add_job('send-mail', ${JSON.stringify({ mailId: id })}::json) from generate_series(1, 4)`;
    await Promise.all([runDueJobs(url, deps), runDueJobs(url, deps), runDueJobs(url, deps)]);
    expect((await subjects()).filter((subject) => subject === mail.subject)).toHaveLength(1);
  });

  it("the sweeper takes up what a dead one held, and leaves alone what is young, in backoff or being sent", async () => {
    const keys = ["dead", "young", "backoff", "sending", "lost"] as const;
    const ids = new Map<string, string>();
    for (const key of keys) {
      const id = await db.transaction((tx) => queueMail(tx, letter({ key })));
      if (id !== null) ids.set(key, id);
    }
    const job = (key: string) => `mail:${ids.get(key)}`;
    await sql`update mails set created_at = now() - interval '10 minutes' where key <> 'young'`;
    // As a killed process leaves it: locked in the queue, but no transaction holds the row any more.
    await sql`update graphile_worker._private_jobs set locked_at = now() - interval '2 minutes', locked_by = 'gone', attempts = 1
               where key in (${job("dead")}, ${job("sending")})`;
    await sql`update graphile_worker._private_jobs set run_at = now() + interval '1 hour', attempts = 3 where key = ${job("backoff")}`;
    await sql`delete from graphile_worker._private_jobs where key = ${job("lost")}`;
    const found = await sql.begin(async (holding) => {
      await holding`select from mails where key = 'sending' for update`;
      return sweep(deps);
    });
    expect(found).toEqual({ mails: 2, readers: 0 });
    await sql`delete from graphile_worker._private_jobs where key in (${job("young")}, ${job("sending")})`;
    await runDueJobs(url, deps);
    const sent = await db.select({ key: mails.key }).from(mails).where(eq(mails.status, "sent"));
    expect(sent.map(({ key }) => key).sort()).toEqual(["dead", "lost"]);
  });
});

describe("what a mail is made of", () => {
  it("keeps non-ASCII whole in subject, text and HTML", async () => {
    const subject = "Čarobnjak Žnidaršić: тренировка, 稽古";
    await db.transaction((tx) =>
      queueMail(tx, letter({ subject, text: "Đurđa → šprint", html: "<p>Đurđa → šprint</p>" })),
    );
    await runDueJobs(url, deps);
    const caught = (await box.caught()).find(({ mail }) => mail.subject === subject);
    expect(caught?.mail.text).toContain("Đurđa → šprint");
    expect(caught?.mail.html).toContain("Đurđa → šprint");
    // RFC 5322 2.2 and 2.1.1: headers are ASCII, no line above 998 octets.
    expect(caught?.source.split("\r\n\r\n")[0]).toMatch(/^[\x00-\x7f]*$/);
    expect(
      Math.max(...(caught?.source.split("\r\n").map((line) => line.length) ?? [Infinity])),
    ).toBeLessThanOrEqual(998);
  });

  it("line breaks in a subject begin no header", async () => {
    await db.transaction((tx) =>
      queueMail(tx, letter({ subject: "Pads\r\nBcc: all@gym.example\r\n\r\nHello\u2028there" })),
    );
    await runDueJobs(url, deps);
    const caught = (await box.caught()).find(({ mail }) => mail.subject?.startsWith("Pads"));
    expect(caught?.mail.subject).toBe("Pads Bcc: all@gym.example Hello there");
    expect(caught?.mail.headers.has("bcc")).toBe(false);
    expect(caught?.envelope.to).toEqual(["ines@gym.example"]);
  });

  it("an address with a comma or a line break reaches nobody else", async () => {
    await db.transaction((tx) =>
      queueMail(tx, letter({ key: "comma", to: "ines@gym.example, spy@gym.example" })),
    );
    await db.transaction((tx) =>
      queueMail(tx, letter({ key: "break", to: "ines@gym.example\r\nRCPT TO:<spy@gym.example>" })),
    );
    await runDueJobs(url, deps);
    const states = await db.select({ status: mails.status }).from(mails);
    expect(states).toEqual([{ status: "failed" }, { status: "failed" }]);
    const everyone = (await box.caught()).flatMap(({ envelope }) => envelope.to);
    expect(everyone).not.toContain("spy@gym.example");
  });

  it("says that a machine wrote it (RFC 3834 section 5)", async () => {
    const mail = letter();
    await db.transaction((tx) => queueMail(tx, mail));
    await runDueJobs(url, deps);
    const caught = (await box.caught()).find(({ mail: one }) => one.subject === mail.subject);
    expect(caught?.mail.headers.get("auto-submitted")).toBe("auto-generated");
  });
});
