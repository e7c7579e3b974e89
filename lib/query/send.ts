import type { FieldError } from "@/lib/errors";

/** Body of a refusal (RFC 9457), with what this application adds to it. */
export interface Problem {
  readonly status: number;
  readonly title: string;
  readonly detail?: string;
  readonly errors?: readonly FieldError[];
}

/** A request that was refused, or never got an answer (`status` 0). */
export class ProblemError extends Error {
  constructor(readonly problem: Problem) {
    super(problem.detail ?? problem.title);
    this.name = "ProblemError";
  }
}

const UNREACHABLE: Problem = {
  status: 0,
  title: "The server cannot be reached. Check the connection and try again.",
};

/** Sends JSON and gives back the JSON of the answer. Throws `ProblemError` for whatever is not a 2xx. */
export async function sendJson<T>(
  url: string,
  body?: unknown,
  method = body === undefined ? "GET" : "POST",
): Promise<T> {
  const response = await fetch(url, {
    method,
    headers: {
      accept: "application/json",
      ...(body !== undefined && { "content-type": "application/json" }),
    },
    ...(body !== undefined && { body: JSON.stringify(body) }),
  }).catch(() => null);
  if (response === null) throw new ProblemError(UNREACHABLE);
  const answer: unknown = await response.json().catch(() => null);
  if (response.ok) return answer as T;
  const given = typeof answer === "object" && answer !== null ? (answer as Partial<Problem>) : {};
  throw new ProblemError({ ...given, title: given.title ?? "That did not work.", status: response.status });
}
