import type { Metadata } from "next";
import { freshDraft } from "@/components/camp/new/fresh-draft";
import { NewCamp } from "@/components/camp/new/new-camp";
import { PageHead } from "@/components/shell/page-head";
import { civilNow, instantOf } from "@/lib/calendar/zones";
import { pageContext } from "@/lib/http/page";
import { can } from "@/lib/policy";
import { listRoster } from "@/lib/services/athletes/athletes";
import { readRules } from "@/lib/services/rules/rules";
import { readTeam } from "@/lib/services/team/team";
import { readTimetable } from "@/lib/services/timetable/timetable";

export const metadata: Metadata = { title: "A new camp" };

interface PageProps {
  readonly searchParams: Promise<{ camp?: string | string[]; athlete?: string | string[] }>;
}

export default async function Page({ searchParams }: PageProps) {
  const ctx = await pageContext("camps.create");
  const [team, { athletes }, { entries }, { overrides }] = await Promise.all([
    readTeam(ctx),
    listRoster(ctx),
    can(ctx.member, "timetable.read") ? readTimetable(ctx) : { entries: [] },
    readRules(ctx),
  ]);
  const given = await searchParams;
  const [link = null] = [given.camp ?? []].flat();
  const [wanted] = [given.athlete ?? []].flat();
  const athlete = athletes.find(({ id }) => id === wanted) ?? null;
  return (
    <>
      <PageHead
        title="A new camp"
        lead="Give the bout, and the camp is laid out around the sport’s own week while you type."
      />
      <NewCamp
        initial={freshDraft({
          link,
          athlete,
          timetable: entries,
          zone: team.timeZone,
          today: civilNow(team.timeZone, ctx.now).day,
        })}
        athletes={athletes}
        rules={overrides}
        now={instantOf(ctx.now)}
      />
    </>
  );
}
