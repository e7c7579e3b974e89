"use client";

import { useState } from "react";
import type { Queue } from "@/lib/offline/queue";
import type { AthleteDay, CheckIn } from "@/lib/schemas/today";
import { Scale } from "./scale";
import { Section, StateWord } from "./section";
import { isWaiting, type Acts } from "./use-acts";

interface CheckInProps {
  readonly day: AthleteDay;
  /** Only today's may be given and changed. */
  readonly editable: boolean;
  readonly queue: Queue;
  readonly acts: Acts;
}

const ROWS = [
  { name: "sleep", label: "Sleep" },
  { name: "fatigue", label: "Fatigue" },
  { name: "soreness", label: "Soreness" },
  { name: "stress", label: "Stress" },
] as const;

const whole = (answers: Partial<CheckIn>): answers is CheckIn =>
  ROWS.every(({ name }) => answers[name] !== undefined);

const spoken = (value: number): string =>
  value === 1 ? "1, very good" : value === 7 ? "7, very poor" : String(value);

/** Four answers in ten seconds; kept with the fourth, and with each change after it. */
export function CheckInCard({ day, editable, queue, acts }: CheckInProps) {
  // Answers of which not all four are given yet; afterwards the day's own count.
  const [draft, setDraft] = useState<Partial<CheckIn>>({});
  const answers = day.checkIn ?? draft;
  const answer = (name: keyof CheckIn, value: number): void => {
    const next = { ...answers, [name]: value };
    setDraft(next);
    if (whole(next)) acts.checkIn(day.date, next);
  };
  if (!editable && !day.checkIn) return null;
  return (
    <Section
      title={editable ? "How are you this morning?" : "Check-in"}
      lead={
        editable ? "1 is very good, 7 is very poor. Takes ten seconds." : "1 is very good, 7 is very poor."
      }
    >
      <div className="mt-1.5">
        {ROWS.map(({ name, label }) => (
          <Scale
            key={name}
            label={label}
            from={1}
            to={7}
            value={answers[name] ?? null}
            onChange={(value) => answer(name, value)}
            fill="upto"
            spoken={spoken}
            said={answers[name] === undefined ? "" : String(answers[name])}
            columns="grid-cols-7"
            disabled={!editable}
          />
        ))}
      </div>
      <StateWord given={day.checkIn !== null} waiting={isWaiting(queue, `check-in:${day.date}`)} />
    </Section>
  );
}
