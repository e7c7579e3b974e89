import type { Metadata } from "next";
import { redirect } from "next/navigation";
import { BoardList } from "@/components/board/board-list";
import { PageHead } from "@/components/shell/page-head";
import { LinkButton } from "@/components/ui/link-button";
import { civilNow } from "@/lib/calendar/zones";
import { pageContext } from "@/lib/http/page";
import { can, isStaff } from "@/lib/policy";
import { listCampSummaries } from "@/lib/services/camps/read";

export const metadata: Metadata = { title: "Camps" };

export default async function Page() {
  const ctx = await pageContext();
  const { camps } = await listCampSummaries(ctx);
  const [only, another] = camps;
  // An athlete's own camp, or the one a guest follows: nothing to choose from.
  if (only && !another && !isStaff(ctx.member.role)) redirect(`/camps/${only.id}`);
  const creates = can(ctx.member, "camps.create");
  return (
    <>
      <PageHead
        title="Camps"
        actions={
          creates ? (
            <LinkButton href="/camps/new" variant="primary">
              Set a bout
            </LinkButton>
          ) : undefined
        }
      />
      <BoardList camps={camps} today={civilNow(ctx.person.timeZone, ctx.now).day} creates={creates} />
    </>
  );
}
