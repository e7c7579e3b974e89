"use client";

import Link from "next/link";
import { weekTitle } from "@/components/session/kinds";
import { PageHead } from "@/components/shell/page-head";
import { Button } from "@/components/ui/button";
import { classNames } from "@/components/ui/class-names";
import { LinkButton } from "@/components/ui/link-button";
import type { SheetView } from "@/lib/schemas/prescription";
import { Paper } from "./paper";

/** The sheet with what stands around it on a screen: the weeks to choose from, and the way to the printer. */
export function SheetPage({ view }: { readonly view: SheetView }) {
  const { campId, athlete, week, weeks } = view;
  return (
    <>
      <div className="print:hidden">
        <PageHead
          title={`Sheet of ${athlete.name}`}
          lead="One camp week on a page of A4, for the gym wall."
          actions={
            <>
              <LinkButton href={`/camps/${campId}`}>To the camp</LinkButton>
              <Button variant="primary" onClick={() => window.print()}>
                Print this week
              </Button>
            </>
          }
        />
        <nav aria-label="Weeks of the camp" className="mb-4 flex flex-wrap gap-1">
          {weeks.map((number) => (
            <Link
              key={number}
              href={`/camps/${campId}/sheet?week=${number}`}
              aria-current={number === week.weeksOut ? "page" : undefined}
              className={classNames(
                "flex min-h-control-small items-center rounded border px-3 text-sm",
                number === week.weeksOut
                  ? "border-ink bg-ink font-semibold text-ink-on"
                  : "border-edge bg-field hover:bg-line-soft",
              )}
            >
              {weekTitle(number)}
            </Link>
          ))}
        </nav>
      </div>
      <Paper view={view} />
    </>
  );
}
