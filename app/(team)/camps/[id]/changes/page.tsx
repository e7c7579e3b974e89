import type { Metadata } from "next";
import { ChangeList } from "@/components/camp/changes/change-list";
import { PageHead } from "@/components/shell/page-head";
import { LinkButton } from "@/components/ui/link-button";
import { orNotFound, pageContext } from "@/lib/http/page";
import { can } from "@/lib/policy";
import { listChanges, readCamp } from "@/lib/services/camps/read";

export const metadata: Metadata = { title: "Changes of a camp" };

interface PageProps {
  readonly params: Promise<{ id: string }>;
}

export default async function Page({ params }: PageProps) {
  const { id } = await params;
  const ctx = await pageContext("camps.history");
  const [view, { changes }] = await orNotFound(
    Promise.all([readCamp(ctx, { params: { id } }), listChanges(ctx, { params: { id } })]),
  );
  return (
    <>
      <PageHead
        title={`Changes in the camp of ${view.athlete.name}`}
        lead="Every save is kept with what it knocked on. Putting one back is a change of its own: nothing is erased, and what is past stays."
        actions={<LinkButton href={`/camps/${view.id}`}>To the camp</LinkButton>}
      />
      <ChangeList
        campId={view.id}
        zone={view.book.homeZone}
        initial={changes}
        putsBack={can(ctx.member, "camps.put-back", view.athlete.id)}
      />
    </>
  );
}
