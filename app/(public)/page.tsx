import type { Metadata } from "next";
import { StartPlanner } from "@/components/start/start-planner";
import { instantOf } from "@/lib/calendar/zones";
import { isoFromDay, weekdayOf } from "@/lib/engine";
import type { Day } from "@/lib/engine/types";
import { now } from "@/lib/clock";
import { START_DEFAULTS, readStartParams } from "@/lib/schemas/start-params";

export const metadata: Metadata = { title: { absolute: "Bellward: strength that peaks on the bell" } };

const SATURDAY = 6;

/** A Saturday that leaves room for a whole camp of the default length. */
function firstBoutDate(today: Day): string {
  const soonest = today + START_DEFAULTS.weeks * 7;
  const wait = (SATURDAY - weekdayOf(soonest as Day) + 7) % 7;
  return isoFromDay((soonest + wait) as Day);
}

interface StartPageProps {
  readonly searchParams: Promise<Record<string, string | string[] | undefined>>;
}

export default async function StartPage({ searchParams }: StartPageProps) {
  const given = Object.entries(await searchParams).flatMap(([key, value]) =>
    [value ?? []].flat().map((single): [string, string] => [key, single]),
  );
  const present = instantOf(now());
  const today = Math.floor(present / 1440) as Day;
  const initial = readStartParams(new URLSearchParams(given), {
    ...START_DEFAULTS,
    date: firstBoutDate(today),
  });
  return (
    <StartPlanner initial={initial} now={present}>
      <h1 className="font-display text-poster uppercase">
        Strength
        <br />
        that peaks
        <br />
        on the bell
      </h1>
      <p className="mt-4 mb-5 max-w-[430px] text-lg text-ink-2">
        Give the bout date. Bellward lays the lifting around sparring, turns strength into power and takes the
        fatigue out in time. Move a sparring day and the lifting follows.
      </p>
    </StartPlanner>
  );
}
