import { randomBytes } from "node:crypto";
import { NextResponse, type NextRequest } from "next/server";
import { PATH_HEADER, signInAddress } from "@/lib/auth/next-path";
import { sessionClaims } from "@/lib/auth/session-token";
import { env } from "@/lib/env";
import { AppError } from "@/lib/errors";
import { contentPolicy, STRICT_TRANSPORT } from "@/lib/http/page-headers";
import { problemResponse } from "@/lib/http/problem";
import { isForeignCall } from "@/lib/http/same-origin";

const TEAM_PAGES = /^\/(board|camps|athletes|timetable|exercises|house-rules|settings|today)(\/|$)/;

const secured = (response: Response): Response => {
  if (env().NODE_ENV === "production" && env().NEXTAUTH_URL.startsWith("https:"))
    response.headers.set("strict-transport-security", STRICT_TRANSPORT);
  return response;
};

/** Path and query as typed, without what Next adds for itself. */
function pathOf({ nextUrl }: NextRequest): string {
  const search = new URLSearchParams(nextUrl.search);
  search.delete("_rsc");
  const query = search.toString();
  return query ? `${nextUrl.pathname}?${query}` : nextUrl.pathname;
}

/** A page: leads strangers to the sign-in, and says what the browser may load, under a nonce of this request alone. */
async function page(request: NextRequest): Promise<Response> {
  const path = pathOf(request);
  if (TEAM_PAGES.test(request.nextUrl.pathname) && !(await sessionClaims(request.headers.get("cookie")))) {
    return NextResponse.redirect(new URL(signInAddress(path), request.url));
  }
  const policy = contentPolicy(randomBytes(16).toString("base64"), {
    development: env().NODE_ENV === "development",
  });
  const headers = new Headers(request.headers);
  headers.set(PATH_HEADER, path);
  // Next reads the nonce for its own scripts from here.
  headers.set("content-security-policy", policy);
  const response = NextResponse.next({ request: { headers } });
  response.headers.set("content-security-policy", policy);
  return response;
}

/** Stands before every page and every call of the API. */
export async function proxy(request: NextRequest): Promise<Response> {
  if (isForeignCall(request, [env().NEXTAUTH_URL, env().APP_URL])) {
    return secured(problemResponse(new AppError("forbidden", "This call comes from another site.")));
  }
  const { pathname } = request.nextUrl;
  return secured(pathname.startsWith("/api/") ? NextResponse.next() : await page(request));
}

// Feeds are read by calendars, often and without a cookie: nothing here is about them, nor about files for everyone.
export const config = {
  matcher: [
    "/((?!_next/static|_next/image|feeds/|icons/|icon.svg|favicon.ico|sw.js|manifest.webmanifest).*)",
  ],
};
