import { readdir, readFile } from "node:fs/promises";
import path from "node:path";
import { simpleParser } from "mailparser";
import { z } from "zod";

/** What the catcher notes of a mail. */
const entrySchema = z.object({
  id: z.string().regex(/^\d+-[0-9a-f]{8}$/),
  receivedAt: z.iso.datetime(),
  envelope: z.object({ from: z.string(), to: z.array(z.string()) }),
  subject: z.string(),
  messageId: z.string().nullable(),
});
export type CaughtEntry = z.infer<typeof entrySchema>;

export interface CaughtMail extends CaughtEntry {
  /** As sent, in order; folded lines are joined. */
  readonly headers: readonly { readonly name: string; readonly value: string }[];
  readonly text: string;
  readonly html: string | null;
  /** Addresses in the text, in order, each once. */
  readonly links: readonly string[];
}

async function readEntry(dir: string, name: string): Promise<CaughtEntry | null> {
  try {
    const read = entrySchema.safeParse(JSON.parse(await readFile(path.join(dir, name), "utf8")));
    return read.success ? read.data : null;
  } catch {
    // Pruned between listing and reading.
    return null;
  }
}

/** Mails that the catcher holds in `dir`, newest first. None where there is no such folder yet. */
export async function listCaught(dir: string): Promise<CaughtEntry[]> {
  const names = await readdir(dir).catch(() => []);
  const entries = await Promise.all(
    names.filter((name) => name.endsWith(".json")).map((name) => readEntry(dir, name)),
  );
  return entries
    .filter((entry) => entry !== null)
    .sort((a, b) => b.id.localeCompare(a.id, "en", { numeric: true }));
}

const LINK = /https?:\/\/[^\s<>"]+/g;

/** One caught mail with its content, or null. An `id` that is not the catcher's own never becomes a path. */
export async function readCaught(dir: string, id: string): Promise<CaughtMail | null> {
  if (!entrySchema.shape.id.safeParse(id).success) return null;
  const entry = await readEntry(dir, `${id}.json`);
  if (!entry) return null;
  const source = await readFile(path.join(dir, `${id}.eml`)).catch(() => null);
  if (!source) return null;
  const mail = await simpleParser(source, {
    skipImageLinks: true,
    skipHtmlToText: true,
    skipTextToHtml: true,
    skipTextLinks: true,
  });
  const text = mail.text ?? "";
  return {
    ...entry,
    headers: mail.headerLines.map(({ line }) => {
      const colon = line.indexOf(":");
      return {
        name: line.slice(0, colon),
        value: line
          .slice(colon + 1)
          .replace(/\r?\n[ \t]+/g, " ")
          .trim(),
      };
    }),
    text,
    html: mail.html || null,
    links: [...new Set(text.match(LINK) ?? [])],
  };
}
