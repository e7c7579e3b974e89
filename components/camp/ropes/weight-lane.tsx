import { dayFromIso } from "@/lib/engine/geometry";
import type { CampBook } from "@/lib/schemas/camp-book";
import type { CampView } from "@/lib/schemas/camp";
import { dayX, weightPath, type RopeDays } from "./geometry";
import { Lane, Rope } from "./lane";

const HEIGHT = 30;
const TOP = 4;

interface WeightLaneProps {
  readonly book: CampBook;
  readonly weights: CampView["weights"];
  readonly days: RopeDays;
}

/** Weights above the limit of the bout, which is the rope. The line to it, ceilings and cautions stand on the athlete's page. */
export function WeightLane({ book, weights, days }: WeightLaneProps) {
  const limit = book.bout.limitKg;
  const points = weights.map(({ date, kg }) => [dayX(days, dayFromIso(date) + 0.5), kg] as const);
  const newest = weights.at(-1);
  const words = limit === null ? "The bout has no limit." : newest ? null : "No weights yet.";
  return (
    <Lane
      title="Weight"
      unit={
        limit === null ? "no limit set" : `kg to ${limit.toFixed(1)}${newest ? `, now ${newest.kg}` : ""}`
      }
      height={HEIGHT}
      over={words ? <span className="absolute top-1.5 left-2 text-2xs text-ink-2">{words}</span> : null}
    >
      {limit === null ? null : <Rope height={HEIGHT} className="stroke-blue" />}
      {limit === null ? null : (
        <path
          d={weightPath(points, limit, TOP, HEIGHT - 1) ?? ""}
          fill="none"
          strokeWidth={1.5}
          vectorEffect="non-scaling-stroke"
          className="stroke-blue"
        />
      )}
    </Lane>
  );
}
