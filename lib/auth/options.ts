import type { NextAuthOptions } from "next-auth";
import CredentialsProvider from "next-auth/providers/credentials";
import { database } from "@/db/pool";
import { findActiveMember } from "@/db/queries/memberships";
import { AppError } from "@/lib/errors";
import { env } from "@/lib/env";
import { logger } from "@/lib/logger";
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

/** Set by our own route for each request; next-auth hands the headers on as they came. */
export const ADDRESS_HEADER = "x-bellward-address";

/** next-auth with e-mail and password. Read at each request: a build has no settings. */
export const authOptions = (): NextAuthOptions => ({
  secret: env().NEXTAUTH_SECRET,
  session: { strategy: "jwt", maxAge: SESSION_SECONDS },
  pages: { signIn: "/sign-in", error: "/sign-in" },
  providers: [
    CredentialsProvider({
      credentials: { email: { type: "email" }, password: { type: "password" } },
      authorize: async (given, request) => {
        const address: unknown = request.headers?.[ADDRESS_HEADER];
        const signIn = {
          email: textOf(given?.email).trim(),
          password: textOf(given?.password),
          address: typeof address === "string" ? address : "direct",
        };
        return checkSignIn(database(), signIn);
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
