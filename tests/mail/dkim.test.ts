import { createHash, generateKeyPairSync, verify } from "node:crypto";
import { describe, expect, it } from "vitest";
import type { MailRow } from "@/db/queries/mails";
import { mailSettings } from "@/lib/mail/settings";
import { smtpSender } from "@/lib/mail/transport";
import { mailbox } from "./mailbox";

const box = await mailbox();
const { privateKey, publicKey } = generateKeyPairSync("rsa", { modulusLength: 2048 });
const pem = privateKey.export({ type: "pkcs8", format: "pem" }).toString();

const env = {
  APP_URL: "http://bellward.test",
  SMTP_URL: box.url,
  MAIL_FROM: '"Bellward, camp" <camp@gym.example>',
  DKIM_DOMAIN: "gym.example",
  DKIM_SELECTOR: "bell",
  DKIM_KEY: pem.replaceAll("\n", "\\n"),
};

const mail: MailRow = {
  id: "00000000-0000-4000-8000-000000000001",
  teamId: null,
  userId: null,
  recipient: "ines@gym.example",
  kind: "changes",
  key: "k",
  messageId: "<1@gym.example>",
  subject: "Šest promjena",
  text: "Text\n",
  html: "<p>HTML</p>",
  status: "waiting",
  attempts: 0,
  headers: {
    "List-Unsubscribe": "<https://bellward.test/api/unsubscribe/t>",
    "List-Unsubscribe-Post": "List-Unsubscribe=One-Click",
    "List-Id": "<changes.gym.example>",
  },
  createdAt: new Date("2026-12-01T12:00:00Z"),
  sentAt: null,
};

/** RFC 6376 3.4.2, relaxed header: name in lower case, unfolded, runs of blanks become one, none at the ends. */
const relaxed = (header: string): string => {
  const colon = header.indexOf(":");
  return `${header.slice(0, colon).toLowerCase().trim()}:${header
    .slice(colon + 1)
    .replace(/\r\n/g, "")
    .replace(/[ \t]+/g, " ")
    .trim()}`;
};

/** RFC 6376 3.4.4, relaxed body. */
const relaxedBody = (body: string): string =>
  `${body
    .split("\r\n")
    .map((line) => line.replace(/[ \t]+/g, " ").replace(/ $/, ""))
    .join("\r\n")
    .replace(/(\r\n)*$/, "")}\r\n`;

describe("a DKIM signature (RFC 6376)", () => {
  it("verifies, and covers both unsubscribe headers (RFC 8058 section 4)", async () => {
    await smtpSender(mailSettings(env))(mail);
    const source = (await box.caught())[0]?.source ?? "";
    const end = source.indexOf("\r\n\r\n");
    const headers = source.slice(0, end).split(/\r\n(?![ \t])/);
    const signature = headers.find((header) => /^DKIM-Signature:/i.test(header)) ?? "";
    const tags = Object.fromEntries(
      relaxed(signature)
        .slice("dkim-signature:".length)
        .split(";")
        .map((tag) => {
          const [name = "", ...value] = tag.split("=");
          return [name.trim(), value.join("=").replace(/\s/g, "")];
        }),
    );
    expect(tags).toMatchObject({ d: "gym.example", s: "bell", a: "rsa-sha256", c: "relaxed/relaxed" });
    const signed = (tags.h ?? "").toLowerCase().split(":");
    expect(signed).toEqual(
      expect.arrayContaining([
        "list-unsubscribe",
        "list-unsubscribe-post",
        "from",
        "date",
        "message-id",
        "subject",
      ]),
    );
    expect(tags.bh).toBe(
      createHash("sha256")
        .update(relaxedBody(source.slice(end + 4)), "latin1")
        .digest("base64"),
    );
    const lines = signed
      .map((name) => headers.find((header) => header.toLowerCase().startsWith(`${name}:`)))
      .filter((line) => line !== undefined)
      .map(relaxed);
    const data = [...lines, relaxed(signature).replace(/(;\s*b=)[^;]*$/, "$1")].join("\r\n");
    expect(
      verify("sha256", Buffer.from(data, "latin1"), publicKey, Buffer.from(tags.b ?? "", "base64")),
    ).toBe(true);
  });

  it("is not made of half the settings", () => {
    expect(() => mailSettings({ ...env, DKIM_KEY: undefined })).toThrow(/DKIM_KEY/);
  });
});

describe("the sender", () => {
  it.each([
    ['"Bellward, camp" <camp@gym.example>', { name: "Bellward, camp", address: "camp@gym.example" }],
    ["Bellward <camp@gym.example>", { name: "Bellward", address: "camp@gym.example" }],
    ["camp@gym.example", { name: "Bellward", address: "camp@gym.example" }],
  ])("is read from %s", (MAIL_FROM, from) => {
    expect(mailSettings({ ...env, MAIL_FROM }).from).toEqual(from);
  });

  it("that is none is refused by name", () => {
    expect(() => mailSettings({ ...env, MAIL_FROM: "a@b <c@d> e" })).toThrow(/MAIL_FROM/);
  });
});
