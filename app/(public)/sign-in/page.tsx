import type { Metadata } from "next";
import { redirect } from "next/navigation";
import { SignInForm } from "@/components/account/sign-in-form";
import { NarrowPage } from "@/components/shell/narrow-page";
import { Notice } from "@/components/ui/notice";
import { safeNext } from "@/lib/auth/next-path";
import { currentMember } from "@/lib/auth/page-member";
import { PageLink } from "@/components/ui/page-link";

export const metadata: Metadata = { title: "Sign in" };

interface SignInProps {
  readonly searchParams: Promise<Record<string, string | string[] | undefined>>;
}

const LINK = "inline-flex min-h-11 items-center font-semibold text-ink underline";

/** Remarks that another page leads here with. */
const SAID: Readonly<Record<string, string>> = {
  reset: "The password is changed. Sign in with the new one.",
  joined: "You are in the team. Sign in to go on.",
};

export default async function SignInPage({ searchParams }: SignInProps) {
  const { next, said } = await searchParams;
  const target = safeNext([next].flat()[0]);
  if (await currentMember()) redirect(target);
  const remark = SAID[[said].flat()[0] ?? ""];
  return (
    <NarrowPage
      title="Sign in"
      below={
        <p className="flex flex-wrap gap-x-6">
          <PageLink href="/reset" className={LINK}>
            Forgot the password?
          </PageLink>
          <PageLink href="/sign-up" className={LINK}>
            Make a team
          </PageLink>
        </p>
      }
    >
      {remark ? <Notice tone="done" title={remark} className="mb-4" /> : null}
      <SignInForm next={target} />
    </NarrowPage>
  );
}
