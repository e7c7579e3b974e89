"use client";

import Link from "next/link";
import { usePathname } from "next/navigation";
import type { KeyboardEvent } from "react";
import { classNames } from "@/components/ui/class-names";
import { Cell, HeadCell, Table } from "@/components/ui/table";
import { AIMS } from "@/lib/engine/prescription/exercise";
import type { ExerciseSummary } from "@/lib/schemas/exercise";
import { AIM_WORDS, doseText, equipmentText, originText, qualitiesText, usedText } from "./words";

interface ExerciseTableProps {
  readonly exercises: readonly ExerciseSummary[];
  /** Filters, which the address keeps when one is opened. */
  readonly query: string;
}

/** On a phone a row is the name with what it trains and needs, and the sets. */
const WIDE = "hidden sm:table-cell";

const STEPS: Readonly<Record<string, number>> = { ArrowDown: 1, ArrowUp: -1 };

/** Arrow keys go from row to row; Home and End to the ends. */
function moveFocus(event: KeyboardEvent<HTMLElement>): void {
  const links = [...event.currentTarget.querySelectorAll<HTMLElement>("a[data-row]")];
  const at = links.findIndex((link) => link === event.target);
  const step = STEPS[event.key];
  const next = event.key === "Home" ? 0 : event.key === "End" ? links.length - 1 : step && at + step;
  if (at < 0 || next === undefined) return;
  event.preventDefault();
  links[Math.max(0, Math.min(next, links.length - 1))]?.focus();
}

function Row({ summary, href, open }: { summary: ExerciseSummary; href: string; open: boolean }) {
  const { exercise, use } = summary;
  const origin = originText(summary);
  return (
    <tr className={classNames("align-top", open && "bg-line-soft")}>
      <HeadCell scope="row" className="py-1.5! sm:min-w-44">
        <Link
          href={href}
          data-row
          prefetch={false}
          aria-current={open ? "page" : undefined}
          className="inline-flex min-h-control-small items-center underline"
        >
          {exercise.name}
        </Link>
        <span className="block text-xs font-normal text-ink-2 sm:hidden">
          {qualitiesText(exercise.qualities)}; needs {equipmentText(exercise.equipment).toLowerCase()}
        </span>
        {origin ? <span className="block text-xs font-normal text-ink-2">{origin}</span> : null}
      </HeadCell>
      <Cell className={WIDE}>{qualitiesText(exercise.qualities)}</Cell>
      <Cell className={WIDE}>{equipmentText(exercise.equipment)}</Cell>
      <Cell>
        {AIMS.map((aim) => {
          const dose = exercise.doses[aim];
          return dose ? (
            <span key={aim} className="block sm:whitespace-nowrap">
              {AIM_WORDS[aim]} {doseText(aim, dose, exercise.sides)}
            </span>
          ) : null;
        })}
      </Cell>
      <Cell className={WIDE}>{usedText(use)}</Cell>
    </tr>
  );
}

/** The list itself. */
export function ExerciseTable({ exercises, query }: ExerciseTableProps) {
  const path = usePathname();
  return (
    <Table caption="Exercises">
      <thead>
        <tr>
          <HeadCell>Exercise</HeadCell>
          <HeadCell className={WIDE}>Trains</HeadCell>
          <HeadCell className={WIDE}>Needs</HeadCell>
          <HeadCell>For</HeadCell>
          <HeadCell className={WIDE}>Chosen or logged</HeadCell>
        </tr>
      </thead>
      <tbody onKeyDown={moveFocus}>
        {exercises.map((summary) => {
          const address = `/exercises/${encodeURIComponent(summary.exercise.id)}`;
          return (
            <Row
              key={summary.exercise.id}
              summary={summary}
              href={query === "" ? address : `${address}?${query}`}
              open={path === address}
            />
          );
        })}
      </tbody>
    </Table>
  );
}
