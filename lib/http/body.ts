import type { ZodType } from "zod";
import { AppError } from "@/lib/errors";

/** Largest body that the API reads, bytes: 256 KiB. */
export const MOST_BYTES = 256 * 1024;

const tooLarge = () => new AppError("too-large", "The body may have 256 KiB at most.");

async function readText(request: Request): Promise<string> {
  if (Number(request.headers.get("content-length") ?? 0) > MOST_BYTES) throw tooLarge();
  const reader = request.body?.getReader();
  if (!reader) return "";
  const chunks: Uint8Array[] = [];
  let size = 0;
  for (;;) {
    const { done, value } = await reader.read();
    if (done) break;
    size += value.byteLength;
    if (size > MOST_BYTES) {
      await reader.cancel();
      throw tooLarge();
    }
    chunks.push(value);
  }
  return new TextDecoder().decode(Buffer.concat(chunks));
}

const pointerOf = (path: readonly PropertyKey[]): string =>
  path.map((part) => `/${String(part).replaceAll("~", "~0").replaceAll("/", "~1")}`).join("");

/** Reads and checks a JSON body. Throws `too-large`, or `invalid` with a JSON pointer per problem. */
export async function readBody<B>(request: Request, schema: ZodType<B>): Promise<B> {
  const text = await readText(request);
  let value: unknown;
  try {
    value = JSON.parse(text);
  } catch {
    throw new AppError("invalid", "The body is not JSON.", {
      errors: [{ pointer: "", message: "Not JSON." }],
    });
  }
  const parsed = schema.safeParse(value);
  if (parsed.success) return parsed.data;
  throw new AppError("invalid", "Some fields need another look.", {
    errors: parsed.error.issues.map((issue) => ({ pointer: pointerOf(issue.path), message: issue.message })),
  });
}
