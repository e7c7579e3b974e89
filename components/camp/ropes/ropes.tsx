"use client";

import { memo } from "react";
import type { Action } from "@/lib/policy";
import type { Day } from "@/lib/engine/types";
import type { CampView } from "@/lib/schemas/camp";
import { campSpan } from "@/lib/book/camp-span";
import type { DayMark } from "../day-mark";
import type { Picture } from "../picture";
import { DayPointer } from "./day-pointer";
import { FormLane } from "./form-lane";
import { LiftingLane, SportLane } from "./load-lanes";
import { PhaseBand } from "./phase-band";
import { WeightLane } from "./weight-lane";

interface RopesProps {
  readonly picture: Picture;
  readonly today: Day;
  readonly weights: CampView["weights"];
  readonly may: readonly Action[];
  readonly mark: DayMark;
}

/** The camp side on, like ring ropes: sport load, lifting, weight; phases underneath, today across. */
export const Ropes = memo(function Ropes({ picture, today, weights, may, mark }: RopesProps) {
  const { from, to } = campSpan(picture.book);
  const days = { from, count: to - from + 1 };
  const detail = may.includes("lifts.detail");
  return (
    <section aria-label="Ropes" className="rounded-md border border-line bg-paper px-4 pt-3 pb-2">
      <div className="relative">
        <div className="grid gap-2.5">
          <SportLane picture={picture} days={days} detail={detail} />
          <LiftingLane picture={picture} days={days} detail={detail} />
          {may.includes("weight.read") ? (
            <WeightLane book={picture.book} weights={weights} days={days} />
          ) : null}
          {detail && picture.plan.form.values.length > 1 ? (
            <FormLane plan={picture.plan} days={days} />
          ) : null}
        </div>
        <PhaseBand plan={picture.plan} days={days} />
        <DayPointer mark={mark} days={days} today={today} picture={picture} detail={detail} />
      </div>
    </section>
  );
});
