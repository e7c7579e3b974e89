import type { ReactNode } from "react";
import { navFor } from "@/components/shell/nav";
import { MAIN_ID, SkipLink } from "@/components/shell/skip-link";
import { TopBar } from "@/components/shell/top-bar";
import { requireMember } from "@/lib/auth/page-member";

/** The athlete's phone: the bar, and one column to the edges of the screen. */
export default async function AthleteLayout({ children }: { readonly children: ReactNode }) {
  const { role, athleteId, name, teamName } = await requireMember();
  return (
    <>
      <SkipLink />
      <TopBar whole nav={navFor({ role, athleteId })} team={teamName} person={name} role={role} />
      <main id={MAIN_ID} tabIndex={-1} className="outline-none">
        {children}
      </main>
    </>
  );
}
