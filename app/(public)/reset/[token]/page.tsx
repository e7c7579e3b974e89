import type { Metadata } from "next";
import { ResetConfirmForm } from "@/components/account/reset-forms";
import { MessagePage } from "@/components/shell/message-page";
import { NarrowPage } from "@/components/shell/narrow-page";
import { LinkButton } from "@/components/ui/link-button";
import { publicContext } from "@/lib/http/page";
import { isResetOpen } from "@/lib/services/accounts/reset";

export const metadata: Metadata = {
  title: "Set a new password",
  robots: { index: false },
  referrer: "no-referrer",
};

interface ResetTokenProps {
  readonly params: Promise<{ token: string }>;
}

/** Opening it uses nothing up: mail scanners open links. */
export default async function ResetTokenPage({ params }: ResetTokenProps) {
  const { token } = await params;
  if (!(await isResetOpen(publicContext(), token))) {
    return (
      <MessagePage
        title="This link no longer works"
        actions={
          <LinkButton href="/reset" variant="primary">
            Ask for a new one
          </LinkButton>
        }
      >
        <p>It was used already, or it is older than 30 minutes, or a newer one was sent.</p>
      </MessagePage>
    );
  }
  return (
    <NarrowPage title="Set a new password" lead="You are signed out everywhere else.">
      <ResetConfirmForm token={token} />
    </NarrowPage>
  );
}
