import { AppError, type ErrorCode } from "@/lib/errors";
import { logger } from "@/lib/logger";

/** The only place where a refusal becomes a status. */
const PROBLEMS = {
  unauthenticated: { status: 401, title: "Sign in first" },
  forbidden: { status: 403, title: "Not for your role" },
  "not-found": { status: 404, title: "Not found" },
  invalid: { status: 422, title: "Check the input" },
  stale: { status: 409, title: "Changed by someone else" },
  conflict: { status: 409, title: "Conflict" },
  "too-large": { status: 413, title: "Too large" },
  "too-many": { status: 429, title: "Too many requests" },
  gone: { status: 410, title: "Gone" },
} as const satisfies Record<ErrorCode, { status: number; title: string }>;

/** Answers a refusal as RFC 9457 problem details; anything else as a 500 that tells nothing of the inside. */
export function problemResponse(error: unknown): Response {
  const headers = new Headers({ "content-type": "application/problem+json", "cache-control": "no-store" });
  if (!(error instanceof AppError)) {
    logger.error({ error }, "unexpected error");
    const body = {
      type: "about:blank",
      title: "Something went wrong",
      status: 500,
      detail: "Nothing was changed. Try again in a moment.",
    };
    return new Response(JSON.stringify(body), { status: 500, headers });
  }
  const { status, title } = PROBLEMS[error.code];
  const { retryAfter, ...extra } = error.extra;
  if (typeof retryAfter === "number") headers.set("retry-after", String(Math.ceil(retryAfter)));
  const body = {
    type: `tag:bellward,2026:${error.code}`,
    title,
    status,
    detail: error.userMessage,
    ...extra,
  };
  return new Response(JSON.stringify(body), { status, headers });
}
