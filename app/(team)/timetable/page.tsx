import type { Metadata } from "next";
import { PageHead } from "@/components/shell/page-head";
import { TimetablePage } from "@/components/timetable/timetable-page";
import { pageContext } from "@/lib/http/page";
import { can } from "@/lib/policy";
import { todayOf } from "@/lib/services/athletes/athletes";
import { readTimetable } from "@/lib/services/timetable/timetable";

export const metadata: Metadata = { title: "Timetable" };

export default async function Page() {
  const ctx = await pageContext("timetable.read");
  const [{ entries }, today] = await Promise.all([readTimetable(ctx), todayOf(ctx)]);
  return (
    <>
      <PageHead
        title="Timetable"
        lead="The gym’s week. New camps take their sport sessions from here; camps that run keep their own."
      />
      <TimetablePage initial={entries} today={today} writes={can(ctx.member, "timetable.write")} />
    </>
  );
}
