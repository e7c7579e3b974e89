import { Cell, HeadCell, Table } from "@/components/ui/table";
import { ASYMMETRY_CAUTION } from "@/lib/engine/measures/asymmetry";
import type { MassUnit } from "@/lib/format/load";
import { measureText } from "@/lib/format/measure";
import type { SideDifference } from "@/lib/schemas/test-trial";
import { dateText } from "../words";
import { seriesTitle } from "./words";

const against = (beyond: boolean | null): string =>
  beyond === null
    ? "own spread not known yet"
    : beyond
      ? "larger than the spread of the own trials"
      : "within the spread of the own trials";

/** Left against right, with the formula, the lower side, and what a difference does not mean. */
export function SideDifferences({
  differences,
  unit,
}: {
  readonly differences: readonly SideDifference[];
  readonly unit: MassUnit;
}) {
  const [first] = differences;
  if (!first) return null;
  return (
    <div className="grid gap-1.5">
      <h3 className="font-semibold">Left and right</h3>
      <Table caption="Left and right, means of the day">
        <thead>
          <tr>
            <HeadCell>Date</HeadCell>
            <HeadCell>Test</HeadCell>
            <HeadCell>Left</HeadCell>
            <HeadCell>Right</HeadCell>
            <HeadCell>Difference</HeadCell>
          </tr>
        </thead>
        <tbody>
          {[...differences].reverse().map((one) => (
            <tr key={one.key}>
              <HeadCell scope="row">{dateText(one.day)}</HeadCell>
              <Cell>{seriesTitle(one, unit)}</Cell>
              <Cell>{measureText(one.left, one.unit)}</Cell>
              <Cell>{measureText(one.right, one.unit)}</Cell>
              <Cell>
                {one.difference.size.toFixed(1)} %
                {one.difference.lower ? `, ${one.difference.lower} lower` : ""};{" "}
                {against(one.beyondOwnSpread)}
              </Cell>
            </tr>
          ))}
        </tbody>
      </Table>
      <p className="text-xs text-ink-2">
        {first.difference.title}. {first.difference.source}. {ASYMMETRY_CAUTION}
      </p>
    </div>
  );
}
