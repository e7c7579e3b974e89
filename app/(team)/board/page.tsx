import type { Metadata } from "next";
import { redirect } from "next/navigation";
import { BoardList } from "@/components/board/board-list";
import { PageHead } from "@/components/shell/page-head";
import { LinkButton } from "@/components/ui/link-button";
import { civilNow } from "@/lib/calendar/zones";
import { pageContext } from "@/lib/http/page";
import { can, isStaff } from "@/lib/policy";
import { listCampSummaries } from "@/lib/services/camps/read";

export const metadata: Metadata = { title: "Board" };

export default async function Page() {
  const ctx = await pageContext();
  if (!isStaff(ctx.member.role)) redirect(ctx.member.role === "athlete" ? "/today" : "/camps");
  const { camps } = await listCampSummaries(ctx);
  const creates = can(ctx.member, "camps.create");
  return (
    <>
      <PageHead
        title="Board"
        lead="Every camp by days out, and the next 14 days."
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
