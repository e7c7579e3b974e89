import type { NextAuthOptions } from "next-auth";
import CredentialsProvider from "next-auth/providers/credentials";
import { database } from "@/db/pool";
import { findActiveMember } from "@/db/queries/memberships";
import { AppError } from "@/lib/errors";
import { env } from "@/lib/env";
import { logger } from "@/lib/logger";
import { addressIn } from "./address";
import { checkSignIn } from "./sign-in";

declare module "next-auth" {
  interface User {
    version: number;
  }
}

declare module "next-auth/jwt" {
  interface JWT {
    version: number;
  }
}

/** Seconds: a signed-in phone stays so for 30 days, then asks again. */
export const SESSION_SECONDS = 30 * 24 * 60 * 60;

/** Longer ones are refused unread: hashing must not become a way to keep the server busy. */
const MOST_CHARACTERS = 254;

const textOf = (value: unknown): string =>
  typeof value === "string" && value.length <= MOST_CHARACTERS ? value : "";

/** next-auth makes an address of the message of what `authorize` throws; `tooManySeconds` reads it back. */
const TOO_MANY = /^too-many:(\d+)$/;

const asMessage = (error: unknown): unknown =>
  error instanceof AppError && error.code === "too-many"
    ? new Error(`too-many:${Math.ceil(Number(error.extra.retryAfter))}`)
    : error;

/** Seconds to wait where next-auth's answer says that sign-in is limited, else null. */
export const tooManySeconds = (error: string | null): number | null => {
  const seconds = TOO_MANY.exec(error ?? "")?.[1];
  return seconds === undefined ? null : Number(seconds);
};

/** next-auth with e-mail and password. Read at each request: a build has no settings. */
export const authOptions = (): NextAuthOptions => ({
  secret: env().NEXTAUTH_SECRET,
  session: { strategy: "jwt", maxAge: SESSION_SECONDS },
  pages: { signIn: "/sign-in", error: "/sign-in" },
  providers: [
    CredentialsProvider({
      credentials: { email: { type: "email" }, password: { type: "password" } },
      authorize: async (given, request) => {
        const forwarded: unknown = request.headers?.["x-forwarded-for"];
        return checkSignIn(database(), {
          email: textOf(given?.email).trim(),
          password: textOf(given?.password),
          address: addressIn(typeof forwarded === "string" ? forwarded : null),
        }).catch((error: unknown) => {
          throw asMessage(error);
        });
      },
    }),
  ],
  callbacks: {
    // A cookie says who and which version of the sessions, nothing else; the database says the rest at each request.
    jwt: async ({ token, user }) => {
      if (user) return { sub: user.id, version: user.version };
      const member = await findActiveMember(database(), token.sub ?? "", token.version);
      if (!member) throw new AppError("unauthenticated", "This session has ended.");
      return { sub: token.sub, version: token.version };
    },
    session: ({ session }) => ({ expires: session.expires }),
  },
  logger: {
    error: (code, details) => logger.debug({ code, details }, "next-auth"),
    warn: (code) => logger.debug({ code }, "next-auth"),
    debug: () => undefined,
  },
});
