import { database } from "@/db/pool";
import { problemResponse } from "@/lib/http/problem";
import { oneClickUnsubscribe } from "@/lib/mail/one-click";

interface UnsubscribeContext {
  readonly params: Promise<{ token: string }>;
}

/** One-click unsubscribe of mail programs (RFC 8058) and of the button on /unsubscribe. There is no GET: it must do nothing. */
export async function POST(request: Request, { params }: UnsubscribeContext): Promise<Response> {
  try {
    return await oneClickUnsubscribe(database(), (await params).token, request);
  } catch (error) {
    return problemResponse(error);
  }
}
