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

/** True for the body that RFC 8058 section 3.2 names, in either of its two encodings. */
async function asksForIt(request: Request): Promise<boolean> {
  try {
    return (await request.formData()).get("List-Unsubscribe") === "One-Click";
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
