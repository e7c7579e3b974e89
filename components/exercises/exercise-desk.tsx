"use client";

import { usePathname } from "next/navigation";
import { useDeferredValue, type ReactNode } from "react";
import { PageHead } from "@/components/shell/page-head";
import { classNames } from "@/components/ui/class-names";
import { EmptyState } from "@/components/ui/empty-state";
import { Button } from "@/components/ui/button";
import { LinkButton } from "@/components/ui/link-button";
import { LiveRegion } from "@/components/ui/live-region";
import { useExercises } from "@/lib/query/exercises";
import type { ExerciseSummary } from "@/lib/schemas/exercise";
import { ExerciseTable } from "./exercise-table";
import { FilterBar } from "./filter-bar";
import { NO_FILTERS, passes } from "./filters";
import { useFilters } from "./use-filters";

const LIST = "/exercises";

interface ExerciseDeskProps {
  readonly initial: readonly ExerciseSummary[];
  readonly adds: boolean;
  /** The exercise that is open, beside the list or, on a phone, instead of it. */
  readonly children: ReactNode;
}

const countText = (shown: number, all: number): string =>
  shown === all ? `${all} exercises` : `${shown} of ${all} exercises`;

/** The team's exercises: filters, list, and the one that is open. */
export function ExerciseDesk({ initial, adds, children }: ExerciseDeskProps) {
  const { data } = useExercises(initial);
  const { filters, setFilters, query } = useFilters();
  const path = usePathname();
  const opened = path !== LIST;
  // Typing stays ahead of the list.
  const wanted = useDeferredValue(filters);
  const shown = data.filter((one) => passes(one, wanted));
  const listAddress = query === "" ? LIST : `${LIST}?${query}`;
  const count = countText(shown.length, data.length);
  return (
    <>
      <PageHead
        title="Exercises"
        lead="The library and what this team made of it. Sessions are filled from what is not shelved."
        actions={
          <>
            {opened ? (
              <LinkButton href={listAddress} className="xl:hidden">
                All exercises
              </LinkButton>
            ) : null}
            {adds && path !== `${LIST}/new` ? (
              <LinkButton href={query === "" ? `${LIST}/new` : `${LIST}/new?${query}`} variant="primary">
                Add an exercise
              </LinkButton>
            ) : null}
          </>
        }
      />
      <div className="grid items-start gap-4 xl:grid-cols-[minmax(0,1fr)_minmax(0,30rem)]">
        <div className={classNames("min-w-0", opened && "hidden xl:block")}>
          <FilterBar filters={filters} onChange={setFilters} />
          <p className="mt-3 mb-2 text-sm text-ink-2">{count}</p>
          <LiveRegion>{count}</LiveRegion>
          {shown.length > 0 ? (
            <ExerciseTable exercises={shown} query={query} />
          ) : (
            <EmptyState
              title="No exercise is left"
              action={<Button onClick={() => setFilters(NO_FILTERS)}>Show all of them</Button>}
            >
              Take a filter off, or look for another word.
            </EmptyState>
          )}
        </div>
        <div
          className={classNames(
            "min-w-0 xl:sticky xl:top-4 xl:max-h-[calc(100dvh-2rem)] xl:overflow-y-auto",
            !opened && "hidden xl:block",
          )}
        >
          {children}
        </div>
      </div>
    </>
  );
}
