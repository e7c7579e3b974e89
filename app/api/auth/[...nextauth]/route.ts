import NextAuth from "next-auth";
import { authOptions, tooManySeconds } from "@/lib/auth/options";
import { AppError } from "@/lib/errors";
import { problemResponse } from "@/lib/http/problem";

interface AuthContext {
  readonly params: Promise<{ nextauth: string[] }>;
}

const handle = (request: Request, context: AuthContext): Promise<Response> =>
  NextAuth(authOptions())(request, context) as Promise<Response>;

/** next-auth answers every refused sign-in with 401; one that was not even tried is a 429 like everywhere else. */
async function withLimit(response: Response): Promise<Response> {
  if (response.status !== 401 || !response.headers.get("content-type")?.includes("json")) return response;
  const { url } = (await response.clone().json()) as { url?: string };
  const retryAfter = tooManySeconds(url ? new URL(url).searchParams.get("error") : null);
  if (retryAfter === null) return response;
  return problemResponse(
    new AppError("too-many", "Too many tries. Wait a few minutes and try again.", { retryAfter }),
  );
}

export const GET = handle;

export const POST = async (request: Request, context: AuthContext): Promise<Response> =>
  withLimit(await handle(request, context));
