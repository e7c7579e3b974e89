import { ProblemError, type Problem } from "./send";

/** What every refused sign-in says: which of the two is wrong is not told. */
const REFUSED: Problem = { status: 401, title: "E-mail or password is wrong." };

async function fresh<T>(
  url: string,
  init?: RequestInit,
): Promise<{ ok: boolean; status: number; answer: Partial<T> }> {
  const response = await fetch(url, { cache: "no-store", ...init }).catch(() => null);
  if (!response)
    throw new ProblemError({
      status: 0,
      title: "The server cannot be reached. Check the connection and try again.",
    });
  const answer = (await response.json().catch(() => ({}))) as Partial<T>;
  return { ok: response.ok, status: response.status, answer };
}

/**
 * Signs in through next-auth's own address: its client would do the same and weigh three times as much on a page that is
 * mostly a form. Throws `ProblemError` where it is refused.
 */
export async function signIn(email: string, password: string): Promise<void> {
  const { csrfToken = "" } = (await fresh<{ csrfToken: string }>("/api/auth/csrf")).answer;
  const body = new URLSearchParams({ email, password, csrfToken, callbackUrl: "/", json: "true" });
  const { ok, status, answer } = await fresh<Problem & { url: string }>("/api/auth/callback/credentials", {
    method: "POST",
    body,
  });
  if (status === 401) throw new ProblemError(REFUSED);
  if (!ok) throw new ProblemError({ ...answer, status, title: answer.title ?? "That did not work." });
  // A stale form token leads back to the sign-in page instead of being refused.
  if (answer.url && new URL(answer.url).searchParams.has("csrf"))
    throw new ProblemError({ status: 403, title: "The page was open for too long. Try again." });
}
