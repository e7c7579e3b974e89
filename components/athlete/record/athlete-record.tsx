import type { ReactNode } from "react";
import type { AthleteRecord } from "@/lib/schemas/athlete-record";
import type { BestsView } from "@/lib/schemas/prescription";
import type { TestsView } from "@/lib/schemas/test-trial";
import { TestsSection } from "../tests/tests-section";
import { BestsSection } from "./bests-section";
import { CampSection } from "./camp-section";
import { CheckInSection } from "./check-in-section";
import { LoadSection } from "./load-section";
import { PartLinks } from "./section";
import { WeightSection } from "./weight-section";

interface RecordPageProps {
  readonly athleteId: string;
  readonly record: AthleteRecord;
  /** Null where the reader may not see them. */
  readonly tests: TestsView | null;
  readonly bests: BestsView | null;
  readonly writesTests: boolean;
  /** Profile, limitations and holds. */
  readonly profile: ReactNode;
}

/** One page of everything that is known of an athlete and may be seen by the reader. */
export function AthleteRecordPage({
  athleteId,
  record,
  tests,
  bests,
  writesTests,
  profile,
}: RecordPageProps) {
  const { unit, today, weight, load, checkIns, camps } = record;
  const parts: readonly (readonly [string, string, ReactNode])[] = [
    ["profile", "Profile", profile],
    ["bests", "Bests", bests && <BestsSection athleteId={athleteId} initial={bests} today={today} />],
    [
      "tests",
      "Tests",
      tests && (
        <TestsSection athleteId={athleteId} initial={tests} today={today} unit={unit} writes={writesTests} />
      ),
    ],
    [
      "weight",
      "Weight",
      weight && <WeightSection athleteId={athleteId} weight={weight} today={today} unit={unit} />,
    ],
    ["load", "Load", load && <LoadSection athleteId={athleteId} load={load} />],
    ["check-ins", "Check-ins", checkIns && <CheckInSection athleteId={athleteId} record={checkIns} />],
    ["camps", "Camps", camps && <CampSection camps={camps} />],
  ];
  const shown = parts.filter(([, , part]) => part !== null);
  return (
    <>
      <PartLinks parts={shown.map(([id, title]) => [id, title])} />
      <div className="grid gap-4">
        {shown.map(([id, , part]) => (
          // The profile brings its own headings; every other part has the id on its heading.
          <div key={id} id={id === "profile" ? id : undefined} className="min-w-0 scroll-mt-20">
            {part}
          </div>
        ))}
      </div>
    </>
  );
}
