/** Codes of everything that can be refused. `lib/http/problem.ts` gives each its status. */
export const ERROR_CODES = [
  "unauthenticated",
  "forbidden",
  "not-found",
  "invalid",
  "stale",
  "conflict",
  "too-large",
  "too-many",
  "gone",
] as const;
export type ErrorCode = (typeof ERROR_CODES)[number];

/** What is wrong with one field: `pointer` is a JSON pointer into the body. */
export interface FieldError {
  readonly pointer: string;
  readonly message: string;
}

/** A refusal that a person may read. `userMessage` is shown; `message` and `cause` are for the log alone. */
export class AppError extends Error {
  constructor(
    readonly code: ErrorCode,
    readonly userMessage: string,
    readonly extra: { readonly errors?: readonly FieldError[]; readonly [member: string]: unknown } = {},
    cause?: unknown,
  ) {
    super(`${code}: ${userMessage}`, { cause });
    this.name = "AppError";
  }
}

/** Missing and foreign look the same from outside. */
export const notFound = () => new AppError("not-found", "There is nothing here that you can see.");
