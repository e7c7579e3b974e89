import { getToken } from "next-auth/jwt";
import { env } from "@/lib/env";

/** What a session cookie says; whether it still holds is for the database to tell. */
export interface SessionClaims {
  readonly userId: string;
  readonly version: number;
}

/** A cookie that is not ours may hold anything. */
const decoded = (value: string): string => {
  try {
    return decodeURIComponent(value);
  } catch {
    return value;
  }
};

const cookiesOf = (header: string): Record<string, string> =>
  Object.fromEntries(
    header.split(";").flatMap((pair) => {
      const at = pair.indexOf("=");
      return at < 0 ? [] : [[pair.slice(0, at).trim(), decoded(pair.slice(at + 1).trim())]];
    }),
  );

/** Reads the signed and encrypted session cookie; null where there is none or it is not ours. */
export async function sessionClaims(cookieHeader: string | null): Promise<SessionClaims | null> {
  if (!cookieHeader) return null;
  const { NEXTAUTH_SECRET: secret, NEXTAUTH_URL } = env();
  const token = await getToken({
    // next-auth 4 reads the cookies of a Node request; only these two members are used.
    req: { cookies: cookiesOf(cookieHeader), headers: {} } as Parameters<typeof getToken>[0]["req"],
    secret,
    secureCookie: NEXTAUTH_URL.startsWith("https:"),
  }).catch(() => null);
  if (typeof token?.sub !== "string" || typeof token.version !== "number") return null;
  return { userId: token.sub, version: token.version };
}
