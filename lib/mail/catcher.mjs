// A mail server that delivers nothing: it takes every mail on loopback and keeps it as a file. Plain Node.
//   CATCHER_DIR=folder CATCHER_PORT=0 node lib/mail/catcher.mjs
// Prints one line of JSON, {"port":N}, once it listens. Each mail becomes <id>.eml, exactly as received, and <id>.json
// (who, subject, when). The .json is written last and renamed into place: where it is, the mail is whole.
import { randomBytes } from "node:crypto";
import { mkdir, readdir, rename, rm, writeFile } from "node:fs/promises";
import path from "node:path";
import { fileURLToPath } from "node:url";
import { simpleParser } from "mailparser";
import { SMTPServer } from "smtp-server";

/** Most mails kept; the oldest go first. */
const KEEP = 500;
/** Bytes; above it a mail is refused, so that a loop cannot fill the disk with one message. */
const MAX_SIZE = 10 * 1024 * 1024;

async function readAll(stream) {
  const parts = [];
  for await (const part of stream) parts.push(part);
  return Buffer.concat(parts);
}

const addressesOf = (field) =>
  [field ?? []].flat().flatMap((list) => list.value.map((entry) => entry.address ?? ""));

let lastTick = 0;
/** Sorts by time of arrival, also for mails of one millisecond. */
function freshId() {
  lastTick = Math.max(Date.now(), lastTick + 1);
  return `${lastTick}-${randomBytes(4).toString("hex")}`;
}

/** Writes one mail; resolves when it is on disk, so that "accepted" means kept. */
async function keep(dir, source, envelope) {
  const id = freshId();
  const mail = await simpleParser(source);
  const entry = {
    id,
    receivedAt: new Date().toISOString(),
    envelope,
    from: addressesOf(mail.from),
    to: addressesOf(mail.to),
    subject: mail.subject ?? "",
    messageId: mail.messageId ?? null,
    file: `${id}.eml`,
  };
  await writeFile(path.join(dir, entry.file), source);
  const fresh = path.join(dir, `${id}.json.new`);
  await writeFile(fresh, `${JSON.stringify(entry, null, 2)}\n`);
  await rename(fresh, path.join(dir, `${id}.json`));
}

async function prune(dir) {
  const entries = (await readdir(dir)).filter((name) => name.endsWith(".json")).sort();
  for (const name of entries.slice(0, Math.max(0, entries.length - KEEP))) {
    // The index entry first: no reader finds an entry without its mail.
    await rm(path.join(dir, name), { force: true });
    await rm(path.join(dir, name.replace(/\.json$/, ".eml")), { force: true });
  }
}

/**
 * Starts a catcher on loopback.
 * @param {{ dir: string; port?: number }} options `port` 0 takes a free one.
 * @returns {Promise<{ port: number; close: () => Promise<void> }>}
 */
export async function startCatcher({ dir, port = 0 }) {
  await mkdir(dir, { recursive: true });
  const server = new SMTPServer({
    authOptional: true,
    disabledCommands: ["AUTH", "STARTTLS"],
    disableReverseLookup: true,
    size: MAX_SIZE,
    // Milliseconds that open sessions get on closing before they are cut.
    closeTimeout: 1000,
    onData(stream, session, done) {
      const envelope = {
        from: session.envelope.mailFrom ? session.envelope.mailFrom.address : "",
        to: session.envelope.rcptTo.map((recipient) => recipient.address),
      };
      readAll(stream)
        .then((source) => {
          if (stream.sizeExceeded) throw Object.assign(new Error("Message too large"), { responseCode: 552 });
          return keep(dir, source, envelope);
        })
        .then(() => prune(dir))
        .then(() => done(), done);
    },
  });
  await new Promise((resolve, reject) => {
    server.once("error", reject);
    server.listen(port, "127.0.0.1", resolve);
  });
  server.removeAllListeners("error");
  // A client that drops its connection half-way is no reason to stop catching.
  server.on("error", (error) => console.error(`mail catcher: ${error.message}`));
  return {
    port: server.server.address().port,
    close: () => new Promise((resolve) => server.close(resolve)),
  };
}

async function main() {
  const dir = process.env.CATCHER_DIR;
  const port = Number(process.env.CATCHER_PORT ?? 0);
  if (!dir || !Number.isInteger(port) || port < 0 || port > 65535) {
    console.error("mail catcher: CATCHER_DIR must name a folder and CATCHER_PORT a port (0: any free one)");
    return 2;
  }
  try {
    const catcher = await startCatcher({ dir: path.resolve(dir), port });
    const stop = () => void catcher.close().then(() => process.exit(0));
    process.once("SIGTERM", stop);
    process.once("SIGINT", stop);
    console.log(JSON.stringify({ port: catcher.port }));
    return null;
  } catch (error) {
    console.error(`mail catcher: ${error.message}`);
    return 1;
  }
}

if (process.argv[1] === fileURLToPath(import.meta.url)) {
  const code = await main();
  if (code !== null) process.exit(code);
}
