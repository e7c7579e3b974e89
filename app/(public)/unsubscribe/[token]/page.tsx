import type { Metadata } from "next";
import { notFound } from "next/navigation";
import { NarrowPage } from "@/components/shell/narrow-page";
import { Button } from "@/components/ui/button";
import { readUnsubscribeToken } from "@/lib/mail/unsubscribe";

export const metadata: Metadata = {
  title: "Stop mail about changes",
  robots: { index: false },
  referrer: "no-referrer",
};

interface UnsubscribeProps {
  readonly params: Promise<{ token: string }>;
}

/** Opening it changes nothing (RFC 8058: mail scanners open links); the button sends what a mail program would. */
export default async function UnsubscribePage({ params }: UnsubscribeProps) {
  const { token } = await params;
  if (readUnsubscribeToken(token) === null) notFound();
  return (
    <NarrowPage
      title="Stop mail about changes?"
      lead="You get no mail any more when a camp changes. Invitations and password resets still come."
      below="One mail a day is a choice too: sign in and open Settings."
    >
      <form method="post" action={`/api/unsubscribe/${token}`}>
        <input type="hidden" name="List-Unsubscribe" value="One-Click" />
        <Button type="submit" variant="primary">
          Stop these mails
        </Button>
      </form>
    </NarrowPage>
  );
}
