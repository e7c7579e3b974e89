import type { Metadata } from "next";
import { AccountPanel } from "@/components/settings/account-panel";
import { FeedsPanel } from "@/components/settings/feeds-panel";
import { PasswordPanel } from "@/components/settings/password-panel";
import { PeoplePanel } from "@/components/settings/people-panel";
import { TeamPanel } from "@/components/settings/team-panel";
import { TeamsPanel } from "@/components/settings/teams-panel";
import { PageHead } from "@/components/shell/page-head";
import { pageContext } from "@/lib/http/page";
import { can } from "@/lib/policy";
import { readAccount } from "@/lib/services/accounts/account";
import { listPeople } from "@/lib/services/accounts/people";
import { listFollowable } from "@/lib/services/athletes/followable";
import { readTeam } from "@/lib/services/team/team";

export const metadata: Metadata = { title: "Settings" };

export default async function SettingsPage() {
  const ctx = await pageContext("account.own");
  const manages = can(ctx.member, "team.manage");
  const [account, athletes, team, people] = await Promise.all([
    readAccount(ctx),
    listFollowable(ctx),
    manages ? readTeam(ctx) : null,
    can(ctx.member, "team.people") ? listPeople(ctx) : null,
  ]);
  return (
    <>
      <PageHead title="Settings" />
      <div className="grid items-start gap-4 xl:grid-cols-2">
        <div className="grid gap-4">
          <AccountPanel initial={account} />
          <PasswordPanel email={account.email} />
          {account.teams.length > 1 ? <TeamsPanel teams={account.teams} /> : null}
        </div>
        <div className="grid gap-4">
          <FeedsPanel role={ctx.member.role} athletes={athletes} />
          {team ? <TeamPanel initial={team} /> : null}
          {people ? <PeoplePanel initial={people} athletes={athletes} manages={manages} /> : null}
        </div>
      </div>
    </>
  );
}
