import type { Metadata } from "next";
import { redirect } from "next/navigation";
import { BoardDesk } from "@/components/board/board-desk";
import { PageHead } from "@/components/shell/page-head";
import { LinkButton } from "@/components/ui/link-button";
import { pageContext } from "@/lib/http/page";
import { can } from "@/lib/policy";
import { readBoard } from "@/lib/services/board/read-board";

export const metadata: Metadata = { title: "Board" };

export default async function Page() {
  const ctx = await pageContext();
  if (!can(ctx.member, "board.read")) redirect(ctx.member.role === "athlete" ? "/today" : "/camps");
  const board = await readBoard(ctx);
  const creates = can(ctx.member, "camps.create");
  return (
    <>
      <PageHead
        title="Board"
        lead="Everyone in camp by days out: three days back, today, ten ahead, and what to look at."
        actions={
          creates ? (
            <LinkButton href="/camps/new" variant="primary">
              Set a bout
            </LinkButton>
          ) : undefined
        }
      />
      <BoardDesk initial={board} creates={creates} />
    </>
  );
}
