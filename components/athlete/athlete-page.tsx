"use client";

import { useAthlete } from "@/lib/query/athletes";
import type { AthleteView } from "@/lib/schemas/athlete";
import { HoldsPanel } from "./holds-panel";
import { LimitationsPanel } from "./limitations-panel";
import { ProfilePanel } from "./profile-panel";

interface AthletePageProps {
  readonly initial: AthleteView;
  readonly today: string;
  readonly may: { readonly edit: boolean; readonly seeHolds: boolean; readonly writeHolds: boolean };
}

/** One athlete: profile and holds. */
export function AthletePage({ initial, today, may }: AthletePageProps) {
  const { data: athlete } = useAthlete(initial);
  return (
    <div className="grid items-start gap-4 xl:grid-cols-[minmax(0,3fr)_minmax(0,2fr)]">
      <ProfilePanel athlete={athlete} edits={may.edit} />
      <div className="grid gap-4">
        {may.seeHolds ? <HoldsPanel athlete={athlete} today={today} writes={may.writeHolds} /> : null}
        <LimitationsPanel athlete={athlete} />
      </div>
    </div>
  );
}
