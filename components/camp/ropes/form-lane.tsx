import type { Plan } from "@/lib/engine/types";
import { dayPercent, dayX, formPath, type RopeDays } from "./geometry";
import { Lane } from "./lane";

const HEIGHT = 40;

interface FormLaneProps {
  readonly plan: Plan;
  readonly days: RopeDays;
}

const daysText = (days: number): string => `${Math.round(days)} days out`;

/** The impulse-response curve, thin, and the two days that the literature gives in closed form (Fitz-Clarke 1991). */
export function FormLane({ plan, days }: FormLaneProps) {
  const { form, bout } = plan;
  const marks = [
    { at: bout.day + 1 - form.helpsMost, text: `helps most, ${daysText(form.helpsMost)}`, end: true },
    {
      at: bout.day + 1 - form.stopsHelping,
      text: `stops helping, ${daysText(form.stopsHelping)}`,
      end: false,
    },
  ].filter((mark) => mark.at > days.from);
  return (
    <Lane
      title="Form"
      unit="an illustration"
      height={HEIGHT}
      over={marks.map((mark) => (
        <span
          key={mark.text}
          className="absolute bottom-0 px-1 text-2xs whitespace-nowrap text-ink-2 max-md:hidden"
          style={
            mark.end
              ? { right: `${100 - dayPercent(days, mark.at)}%` }
              : { left: `${dayPercent(days, mark.at)}%` }
          }
        >
          Training {mark.text}
        </span>
      ))}
    >
      {marks.map((mark) => (
        <line
          key={mark.text}
          x1={dayX(days, mark.at)}
          x2={dayX(days, mark.at)}
          y1={0}
          y2={HEIGHT}
          strokeDasharray="2 3"
          vectorEffect="non-scaling-stroke"
          className="stroke-ink-3"
        />
      ))}
      <path
        d={formPath(plan, days, 4, HEIGHT - 14) ?? ""}
        fill="none"
        strokeWidth={1.2}
        vectorEffect="non-scaling-stroke"
        className="stroke-ink-2"
      />
    </Lane>
  );
}
