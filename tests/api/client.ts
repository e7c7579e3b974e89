import { encode } from "next-auth/jwt";
import { env } from "@/lib/env";

/** The cookie that next-auth gives to whoever signs in: signed and encrypted with this process's secret. */
export async function cookieOf(userId: string, version = 1): Promise<string> {
  const token = await encode({ token: { sub: userId, version }, secret: env().NEXTAUTH_SECRET });
  return `next-auth.session-token=${token}`;
}

export interface Call {
  readonly method?: string;
  readonly cookie?: string;
  readonly body?: unknown;
  /** A body that is no JSON of ours. */
  readonly raw?: string;
  readonly params?: Record<string, string>;
  readonly headers?: Record<string, string>;
  readonly query?: string;
}

interface Problem {
  readonly type: string;
  readonly title: string;
  readonly status: number;
  readonly detail: string;
  readonly errors?: readonly { readonly pointer: string; readonly message: string }[];
}

type Handler = (
  request: Request,
  context: { params: Promise<Record<string, string>> },
) => Promise<Response> | Response;

/** Calls a route handler as Next would. */
export async function call(handler: Handler, given: Call = {}): Promise<Response> {
  const { cookie, params = {}, headers = {}, query = "" } = given;
  const body = given.raw ?? (given.body === undefined ? undefined : JSON.stringify(given.body));
  const method = given.method ?? (body === undefined ? "GET" : "POST");
  const request = new Request(`http://bellward.test/api/test${query}`, {
    method,
    headers: { "content-type": "application/json", ...(cookie && { cookie }), ...headers },
    ...(body !== undefined && { body }),
  });
  return handler(request, { params: Promise.resolve(params) });
}

/** Body of a refusal; fails the test where it is not problem+json of its status (RFC 9457 section 3). */
export async function problemOf(response: Response): Promise<Problem> {
  const type = response.headers.get("content-type");
  if (type !== "application/problem+json") throw new Error(`${response.status} ${type}: no problem`);
  const problem = (await response.json()) as Problem;
  if (problem.status !== response.status) throw new Error(`says ${problem.status}, is ${response.status}`);
  return problem;
}
