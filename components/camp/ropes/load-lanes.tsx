import { classNames } from "@/components/ui/class-names";
import { liftLook } from "@/components/session/kinds";
import type { Day } from "@/lib/engine/types";
import type { Picture } from "../picture";
import { dayX, taperPath, type RopeDays } from "./geometry";
import { Lane, ROPE_WIDTH, Rope } from "./lane";

const HEIGHT = 54;
const TOP = 4;
const FOOT = HEIGHT - 2;

interface Bar {
  readonly day: Day;
  readonly value: number;
  readonly className: string;
}

function Bars({
  days,
  bars,
  most,
}: {
  readonly days: RopeDays;
  readonly bars: readonly Bar[];
  readonly most: number;
}) {
  const width = ROPE_WIDTH / days.count;
  return bars.map((bar) => {
    const height = (bar.value / most) * (FOOT - TOP);
    return (
      <rect
        key={`${bar.day} ${bar.className}`}
        x={dayX(days, bar.day) + width * 0.15}
        width={width * 0.7}
        y={FOOT - height}
        height={height}
        className={bar.className}
      />
    );
  });
}

function WeekLines({ days }: { readonly days: RopeDays }) {
  return Array.from({ length: days.count / 7 + 1 }, (_, week) => (
    <line
      key={week}
      x1={(week * 7 * ROPE_WIDTH) / days.count}
      x2={(week * 7 * ROPE_WIDTH) / days.count}
      y1={0}
      y2={HEIGHT}
      vectorEffect="non-scaling-stroke"
      className="stroke-line-soft"
    />
  ));
}

interface LoadLaneProps {
  readonly picture: Picture;
  readonly days: RopeDays;
  /** False where the reader sees no numbers: then a bar only says that there is a session. */
  readonly detail: boolean;
}

/** Sport load a day; days with hard sparring in red. */
export function SportLane({ picture, days, detail }: LoadLaneProps) {
  const hard = new Set(
    picture.sport.filter((session) => session.kind === "hard-sparring").map((session) => session.day),
  );
  const loads = new Map<Day, number>();
  for (const { day, effort, minutes } of picture.sport) {
    loads.set(day, (loads.get(day) ?? 0) + (detail ? effort * minutes : 1));
  }
  const bars = [...loads].map(([day, value]) => ({
    day,
    value: detail ? value : 1,
    className: hard.has(day) ? "fill-red" : "fill-ink-3/45",
  }));
  return (
    <Lane title="Ring and mat" unit={detail ? "sport load, AU" : "sessions"} height={HEIGHT}>
      <WeekLines days={days} />
      <Bars days={days} bars={bars} most={Math.max(1, ...bars.map((bar) => bar.value))} />
      <Rope height={HEIGHT} className="stroke-red" />
    </Lane>
  );
}

/** Working sets a day, and what share of them the taper leaves. */
export function LiftingLane({ picture, days, detail }: LoadLaneProps) {
  const { plan } = picture;
  const bars = plan.lifts.map((lift) => ({
    day: lift.day,
    value: detail ? lift.sets : 1,
    className: classNames(liftLook(lift.item, lift.phase).fill),
  }));
  const taper = detail ? taperPath(plan, days, TOP, FOOT) : null;
  return (
    <Lane title="Lifting" unit={detail ? "working sets" : "sessions"} height={HEIGHT}>
      <WeekLines days={days} />
      <Bars days={days} bars={bars} most={Math.max(1, ...bars.map((bar) => bar.value)) * 1.08} />
      {taper ? (
        <path
          d={taper}
          fill="none"
          strokeWidth={1.4}
          strokeDasharray="5 4"
          vectorEffect="non-scaling-stroke"
          className="stroke-ink"
        />
      ) : null}
      <Rope height={HEIGHT} className="stroke-iron" />
    </Lane>
  );
}
