import { database } from "@/db/pool";
import { now } from "@/lib/clock";
import { noneMatch } from "@/lib/http/entity-tag";
import { problemResponse } from "@/lib/http/problem";
import { readFeed } from "@/lib/services/feeds/read";

type Context = { params: Promise<{ token: string }> };

const headersOf = (etag: string) => ({
  etag,
  "cache-control": "private",
  "x-robots-tag": "noindex",
  "referrer-policy": "no-referrer",
});

const CALENDAR = {
  "content-type": "text/calendar; charset=utf-8",
  "content-disposition": 'inline; filename="bellward.ics"',
};

/** The secret in the address is all that is asked: a calendar cannot sign in. */
async function answer(request: Request, { params }: Context): Promise<Response> {
  try {
    const reading = await readFeed(database(), (await params).token, now());
    if (noneMatch(request.headers.get("if-none-match"), reading.etag)) {
      return new Response(null, { status: 304, headers: headersOf(reading.etag) });
    }
    if (request.method === "HEAD")
      return new Response(null, { headers: { ...headersOf(reading.etag), ...CALENDAR } });
    const { etag, body } = await reading.build();
    return new Response(body, { headers: { ...headersOf(etag), ...CALENDAR } });
  } catch (error) {
    return problemResponse(error);
  }
}

export { answer as GET, answer as HEAD };
