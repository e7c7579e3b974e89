import type { Metadata } from "next";
import { cache } from "react";
import { AthletePage } from "@/components/athlete/athlete-page";
import { AthleteRecordPage } from "@/components/athlete/record/athlete-record";
import { PageHead } from "@/components/shell/page-head";
import { LinkButton } from "@/components/ui/link-button";
import { orNotFound, pageContext } from "@/lib/http/page";
import { can, isStaff } from "@/lib/policy";
import { readAthlete, todayOf } from "@/lib/services/athletes/athletes";
import { listAthleteBests } from "@/lib/services/prescription/bests";
import { readAthleteRecord } from "@/lib/services/record/read-record";
import { listTests } from "@/lib/services/tests/tests";

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
  const of = { params: { id: athlete.id } };
  const seesTests = can(ctx.member, "tests.read", athlete.id);
  const [record, tests, bests] = await Promise.all([
    orNotFound(readAthleteRecord(ctx, of)),
    seesTests ? listTests(ctx, of) : null,
    seesTests ? listAthleteBests(ctx, of) : null,
  ]);
  return (
    <>
      <PageHead
        title={athlete.name}
        lead={athlete.sport || undefined}
        actions={
          isStaff(ctx.member.role) ? <LinkButton href="/athletes">All athletes</LinkButton> : undefined
        }
      />
      <AthleteRecordPage
        key={athlete.id}
        athleteId={athlete.id}
        record={record}
        tests={tests}
        bests={bests}
        writesTests={can(ctx.member, "tests.write", athlete.id)}
        profile={
          <AthletePage
            initial={athlete}
            today={today}
            may={{
              edit: can(ctx.member, "athletes.write", athlete.id),
              seeHolds: can(ctx.member, "holds.read", athlete.id),
              writeHolds: can(ctx.member, "holds.write", athlete.id),
            }}
          />
        }
      />
    </>
  );
}
