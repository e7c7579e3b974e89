import type { Metadata } from "next";
import { redirect } from "next/navigation";
import { Roster } from "@/components/athlete/roster";
import { PageHead } from "@/components/shell/page-head";
import { LinkButton } from "@/components/ui/link-button";
import { pageContext } from "@/lib/http/page";
import { can, isStaff } from "@/lib/policy";
import { listRoster } from "@/lib/services/athletes/athletes";

export const metadata: Metadata = { title: "Athletes" };

export default async function AthletesPage() {
  const ctx = await pageContext("athletes.read");
  const { athletes } = await listRoster(ctx);
  // An athlete's roster is the athlete.
  if (!isStaff(ctx.member.role)) redirect(athletes[0] ? `/athletes/${athletes[0].id}` : "/camps");
  const adds = can(ctx.member, "athletes.write");
  return (
    <>
      <PageHead
        title="Athletes"
        actions={
          adds ? (
            <LinkButton href="/athletes/new" variant="primary">
              Add an athlete
            </LinkButton>
          ) : undefined
        }
      />
      <Roster athletes={athletes} adds={adds} />
    </>
  );
}
