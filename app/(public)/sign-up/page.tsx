import type { Metadata } from "next";
import { redirect } from "next/navigation";
import { SignUpForm } from "@/components/account/sign-up-form";
import { NarrowPage } from "@/components/shell/narrow-page";
import { currentMember } from "@/lib/auth/page-member";
import { PageLink } from "@/components/ui/page-link";

export const metadata: Metadata = { title: "Make a team" };

interface SignUpProps {
  readonly searchParams: Promise<{ camp?: string | string[] }>;
}

export default async function SignUpPage({ searchParams }: SignUpProps) {
  const [camp = null] = [(await searchParams).camp ?? []].flat();
  const carried = camp === null ? "/camps/new" : `/camps/new?camp=${encodeURIComponent(camp)}`;
  // Whoever has an account keeps the camp in the team there is.
  if (await currentMember()) redirect(carried);
  return (
    <NarrowPage
      title={camp === null ? "Make a team" : "Keep this camp"}
      lead={
        camp === null
          ? "You become its head coach and invite the others."
          : "Make a team and the camp is saved in it. You become its head coach and invite the others."
      }
      below={
        <PageLink
          href={`/sign-in?next=${encodeURIComponent(carried)}`}
          className="inline-flex min-h-11 items-center font-semibold text-ink underline"
        >
          I have an account: sign in
        </PageLink>
      }
    >
      <SignUpForm camp={camp} />
    </NarrowPage>
  );
}
