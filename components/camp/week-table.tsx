import { PHASE_LOOKS, weekTitle } from "@/components/session/kinds";
import { Cell, HeadCell, Table } from "@/components/ui/table";
import type { Plan } from "@/lib/engine/types";

const whole = (value: number | null): string => (value === null ? "–" : String(Math.round(value)));
const share = (value: number | null): string => (value === null ? "–" : value.toFixed(2));

/** The ropes in numbers, a row a camp week. */
export function WeekTable({ plan }: { readonly plan: Plan }) {
  return (
    <details className="mt-4">
      <summary className="flex min-h-control items-center text-sm font-semibold underline decoration-1 underline-offset-4">
        The weeks in numbers
      </summary>
      <Table caption="Load of each camp week" className="mt-2">
        <thead>
          <tr>
            <HeadCell>Week</HeadCell>
            <HeadCell>Phase</HeadCell>
            <HeadCell className="text-right">Working sets</HeadCell>
            <HeadCell className="text-right">Sport load, AU</HeadCell>
            <HeadCell className="text-right">Lifting load, AU</HeadCell>
            <HeadCell className="text-right">Cap, AU</HeadCell>
            <HeadCell className="text-right">Monotony</HeadCell>
            <HeadCell className="text-right">Strain, AU</HeadCell>
          </tr>
        </thead>
        <tbody>
          {plan.weeks.map((week) => (
            <tr key={week.weeksOut}>
              <HeadCell scope="row">{weekTitle(week.weeksOut)}</HeadCell>
              <Cell>
                {PHASE_LOOKS[week.phase].label}
                {week.deload ? ", light" : ""}
              </Cell>
              <Cell className="text-right">{week.sets}</Cell>
              <Cell className="text-right">{whole(week.sportLoad)}</Cell>
              <Cell className="text-right">{whole(week.liftingLoad)}</Cell>
              <Cell className="text-right">{whole(week.loadCap)}</Cell>
              <Cell className="text-right">{share(week.monotony)}</Cell>
              <Cell className="text-right">{whole(week.strain)}</Cell>
            </tr>
          ))}
        </tbody>
      </Table>
      <p className="mt-2 text-xs text-ink-2">
        Load is session effort (CR-10) × minutes; monotony is the mean of the week’s seven daily loads over
        their standard deviation, strain the week’s load × monotony (Foster 1998). The form curve in the ropes
        is an illustration of training theory, not a forecast.
      </p>
    </details>
  );
}
