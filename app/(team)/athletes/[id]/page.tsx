import type { Metadata } from "next";
import { cache } from "react";
import { AthletePage } from "@/components/athlete/athlete-page";
import { PageHead } from "@/components/shell/page-head";
import { LinkButton } from "@/components/ui/link-button";
import { orNotFound, pageContext } from "@/lib/http/page";
import { can, isStaff } from "@/lib/policy";
import { readAthlete, todayOf } from "@/lib/services/athletes/athletes";

interface PageProps {
  readonly params: Promise<{ id: string }>;
}

// The title and the page ask for the same athlete; it is read once.
const athleteOf = cache(async (id: string) => {
  const ctx = await pageContext("athletes.read");
  const [athlete, today] = await Promise.all([
    orNotFound(readAthlete(ctx, { params: { id } })),
    todayOf(ctx),
  ]);
  return { ctx, athlete, today };
});

export async function generateMetadata({ params }: PageProps): Promise<Metadata> {
  const { athlete } = await athleteOf((await params).id);
  return { title: athlete.name };
}

export default async function Page({ params }: PageProps) {
  const { ctx, athlete, today } = await athleteOf((await params).id);
  return (
    <>
      <PageHead
        title={athlete.name}
        lead={athlete.sport || undefined}
        actions={
          isStaff(ctx.member.role) ? <LinkButton href="/athletes">All athletes</LinkButton> : undefined
        }
      />
      <AthletePage
        key={athlete.id}
        initial={athlete}
        today={today}
        may={{
          edit: can(ctx.member, "athletes.write", athlete.id),
          seeHolds: can(ctx.member, "holds.read", athlete.id),
          writeHolds: can(ctx.member, "holds.write", athlete.id),
        }}
      />
    </>
  );
}
