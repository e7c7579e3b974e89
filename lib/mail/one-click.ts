import type { Tx } from "@/db/client";
import { html } from "./html";
import { STYLE, letterHtml, link, paragraph, quiet } from "./layout";
import { mailSettings } from "./settings";
import { unsubscribe } from "./unsubscribe";

const page = (status: number, title: string, text: string): Response => {
  const settings = `${mailSettings().appUrl}/settings`;
  const body = html`<h1 class="ink" style="${STYLE.heading}">${title}</h1>
    ${paragraph(text)}`;
  return new Response(letterHtml({ title, body, footer: quiet(link("Settings", settings)) }), {
    status,
    headers: {
      "Content-Type": "text/html; charset=utf-8",
      "Cache-Control": "no-store",
      "Referrer-Policy": "no-referrer",
    },
  });
};

/** Bytes; the body that is meant has about 200 with its multipart frame. Anyone can post here. */
const MOST_BYTES = 4096;

/** The body, or null where it is longer than it can rightly be: the rest is not read. */
async function shortBody(request: Request): Promise<Blob | null> {
  const reader = request.body?.getReader();
  const parts: Uint8Array<ArrayBuffer>[] = [];
  let length = 0;
  for (let part = await reader?.read(); part && !part.done; part = await reader?.read()) {
    length += part.value.byteLength;
    if (length > MOST_BYTES) {
      await reader?.cancel();
      return null;
    }
    parts.push(part.value);
  }
  return new Blob(parts);
}

/** True for the body that RFC 8058 section 3.2 names, in either of its two encodings. */
async function asksForIt(request: Request): Promise<boolean> {
  const body = await shortBody(request);
  if (!body) return false;
  try {
    const form = await new Response(body, {
      headers: { "Content-Type": request.headers.get("Content-Type") ?? "" },
    }).formData();
    return form.get("List-Unsubscribe") === "One-Click";
  } catch {
    // Neither multipart nor urlencoded.
    return false;
  }
}

/**
 * One-click unsubscribe (RFC 8058): no cookie, no sign-in, no redirect; the address itself is the authority. Answers a page,
 * because the button of /unsubscribe posts here too; a mail program reads only the status.
 */
export async function oneClickUnsubscribe(tx: Tx, token: string, request: Request): Promise<Response> {
  if (!(await asksForIt(request))) {
    return page(400, "Nothing was changed", "The request did not say List-Unsubscribe=One-Click.");
  }
  if (!(await unsubscribe(tx, token))) {
    return page(
      404,
      "Nothing was changed",
      "This address names nobody. It may have been cut short in the mail.",
    );
  }
  return page(200, "No more mail about changes", "It is done. You can turn it on again in Settings.");
}
