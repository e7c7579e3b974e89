"use client";

import { equipmentText } from "@/components/exercises/words";
import { AGE_WORDS, BASE_WORDS, WEEKDAY_TOGGLES } from "@/components/start/words";
import { Notice } from "@/components/ui/notice";
import { Panel } from "@/components/ui/panel";
import { showToast } from "@/components/ui/toasts";
import { useSaveAthlete } from "@/lib/query/athletes";
import type { AthleteView } from "@/lib/schemas/athlete";
import { ProfileForm } from "./profile-form";
import { codesText } from "./words";

const birthText = (date: string): string =>
  new Intl.DateTimeFormat("en-GB", { dateStyle: "long", timeZone: "UTC" }).format(
    new Date(`${date}T00:00:00Z`),
  );

const hoursText = (hours: AthleteView["freeHours"]): string =>
  hours.length === 0
    ? "None given"
    : hours
        .map(({ weekday, from, to }) => `${WEEKDAY_TOGGLES[weekday - 1]?.label ?? weekday} ${from}–${to}`)
        .join(", ");

/** "Boxing", or "Boxing 70 %, grappling 30 %". */
function baseText({ strikingBase, secondBase, secondShare }: AthleteView): string {
  const first = BASE_WORDS[strikingBase];
  if (secondBase === null || secondShare === null) return first;
  const second = Math.round(secondShare * 100);
  return `${first} ${100 - second} %, ${BASE_WORDS[secondBase].toLowerCase()} ${second} %`;
}

/** The same for those who only read. */
function Facts({ athlete }: { readonly athlete: AthleteView }) {
  const facts: readonly (readonly [string, string])[] = [
    ["Sport", athlete.sport || "Not given"],
    ["Striking base", baseText(athlete)],
    ["Training age", AGE_WORDS[athlete.trainingAge]],
    ["Lifts a week", String(athlete.liftsPerWeek)],
    ["Date of birth", athlete.dateOfBirth ? birthText(athlete.dateOfBirth) : "Not given"],
    ["Free for lifting", hoursText(athlete.freeHours)],
    ["Limitations", athlete.limitations || "None given"],
    ["Left out of sessions", codesText(athlete.limitationCodes) || "Nothing"],
    ["Equipment", equipmentText(athlete.equipment)],
    ["Smallest step of load", `${athlete.plateStep} ${athlete.plateUnit}`],
  ];
  return (
    <dl className="grid gap-x-6 gap-y-3 sm:grid-cols-2">
      {facts.map(([name, value]) => (
        <div key={name} className="min-w-0">
          <dt className="text-sm font-semibold">{name}</dt>
          <dd className="break-words whitespace-pre-line text-ink-2">{value}</dd>
        </div>
      ))}
    </dl>
  );
}

interface ProfilePanelProps {
  readonly athlete: AthleteView;
  readonly edits: boolean;
}

/** An athlete's profile. Camps that run keep the facts that they were planned with. */
export function ProfilePanel({ athlete, edits }: ProfilePanelProps) {
  const save = useSaveAthlete(athlete.id);
  const { id: _id, minor, holds: _holds, limitationHistory: _history, ...start } = athlete;
  return (
    <Panel title="Profile">
      {minor ? (
        <Notice tone="caution" title="Under 18" className="mb-4">
          Weight descent is switched off for a minor: a body that still grows is not dieted down to a limit.
        </Notice>
      ) : null}
      {edits ? (
        <ProfileForm
          start={start}
          minor={minor}
          act="Save the profile"
          save={async (form) => {
            await save.mutateAsync(form);
            showToast("Saved. Camps that run keep what they were planned with; new ones take it.");
          }}
        />
      ) : (
        <Facts athlete={athlete} />
      )}
    </Panel>
  );
}
