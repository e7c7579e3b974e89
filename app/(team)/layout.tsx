import type { ReactNode } from "react";
import { navFor } from "@/components/shell/nav";
import { TeamShell } from "@/components/shell/team-shell";
import { requireMember } from "@/lib/auth/page-member";
import { ROLE_TITLES } from "@/lib/policy";
import { QueryProvider } from "@/lib/query/query-provider";

export default async function TeamLayout({ children }: { readonly children: ReactNode }) {
  const { role, athleteId, name, teamName } = await requireMember();
  return (
    <QueryProvider>
      <TeamShell
        nav={navFor({ role, athleteId })}
        team={teamName}
        person={name}
        role={ROLE_TITLES[role].replace(/^[A-Z](?=[a-z])/, (letter) => letter.toLowerCase())}
      >
        {children}
      </TeamShell>
    </QueryProvider>
  );
}
