import type { Metadata } from "next";
import { InviteForm } from "@/components/account/invite-form";
import { MessagePage } from "@/components/shell/message-page";
import { NarrowPage } from "@/components/shell/narrow-page";
import { currentMember } from "@/lib/auth/page-member";
import { publicContext } from "@/lib/http/page";
import { ROLE_TITLES } from "@/lib/policy";
import { readInvite } from "@/lib/services/accounts/accept-invite";
import { PageLink } from "@/components/ui/page-link";

export const metadata: Metadata = { title: "Invitation", robots: { index: false }, referrer: "no-referrer" };

interface InviteProps {
  readonly params: Promise<{ token: string }>;
}

export default async function InvitePage({ params }: InviteProps) {
  const { token } = await params;
  const member = await currentMember();
  const found = await readInvite(publicContext(), token, member?.userId ?? null);
  if (!found) {
    return (
      <MessagePage title="This invitation no longer works">
        <p>It was used already, taken back, or is older than 7 days. Ask the team for a new one.</p>
      </MessagePage>
    );
  }
  const { team, role, invitedBy, email, hasAccount, signedIn } = found;
  return (
    <NarrowPage
      title={`Join ${team}`}
      lead={`${invitedBy ?? "The team"} invites ${email}. Role: ${ROLE_TITLES[role]}.`}
      below={
        hasAccount && !signedIn ? (
          <PageLink
            href="/reset"
            className="inline-flex min-h-11 items-center font-semibold text-ink underline"
          >
            Forgot the password?
          </PageLink>
        ) : undefined
      }
    >
      {member && !signedIn ? (
        <p className="mb-4 text-sm text-ink-2">
          You are signed in as {member.email}. Joining signs you in as {email} instead.
        </p>
      ) : null}
      <InviteForm token={token} email={email} hasAccount={hasAccount} signedIn={signedIn} />
    </NarrowPage>
  );
}
