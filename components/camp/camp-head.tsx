import { Button } from "@/components/ui/button";
import { LinkButton } from "@/components/ui/link-button";
import { dayFromIso } from "@/lib/engine/geometry";
import type { Day } from "@/lib/engine/types";
import type { CampBook } from "@/lib/schemas/camp-book";
import type { CampView } from "@/lib/schemas/camp";
import { boutLine, daysOutText } from "./bout-line";

interface CampHeadProps {
  readonly view: CampView;
  /** As shown: a bout that is being moved counts from its new day. */
  readonly book: CampBook;
  readonly today: Day;
  readonly onBout: () => void;
  readonly onAdd: () => void;
}

function DaysOut({ boutDay, today }: { readonly boutDay: Day; readonly today: Day }) {
  const { count, words } = daysOutText(boutDay, today);
  return (
    <p className="flex items-end gap-2.5">
      <span className="font-display text-count max-md:text-[84px]">{count}</span>
      <span className="font-display text-2xl leading-[0.95] text-ink-2 uppercase">
        {words[0]}
        <br />
        {words[1]}
      </span>
    </p>
  );
}

/** Days out, the bout, and what one can do with the camp as a whole. */
export function CampHead({ view, book, today, onBout, onAdd }: CampHeadProps) {
  const { when, rest } = boutLine(book);
  const { may } = view;
  return (
    <header className="grid items-end gap-x-6 gap-y-3 pb-3.5 md:grid-cols-[auto_minmax(0,1fr)] xl:grid-cols-[auto_minmax(0,1fr)_auto]">
      <DaysOut boutDay={dayFromIso(book.bout.date)} today={today} />
      <div className="min-w-0">
        <h1 className="text-2xl font-semibold">
          {view.athlete.name}
          {book.bout.opponent ? (
            <>
              {" "}
              <span className="font-normal text-ink-3">v</span> {book.bout.opponent}
            </>
          ) : null}
        </h1>
        <p className="mt-0.5 text-sm text-ink-2">
          {book.status === "off" ? <b className="font-semibold text-ink">The bout is off. </b> : null}
          <b className="font-semibold text-ink">{when}</b>
          {rest}
        </p>
      </div>
      <div className="flex flex-wrap gap-2 md:col-span-2 xl:col-span-1">
        <LinkButton size="small" href="/settings#feeds">
          Subscribe
        </LinkButton>
        <LinkButton size="small" href={`/camps/${view.id}/sheet`}>
          Sheet
        </LinkButton>
        {may.includes("camps.history") ? (
          <LinkButton size="small" href={`/camps/${view.id}/changes`}>
            Changes
          </LinkButton>
        ) : null}
        {may.includes("report.read") && (book.status === "off" || dayFromIso(book.bout.date) <= today) ? (
          <LinkButton size="small" href={`/camps/${view.id}/report`}>
            Report
          </LinkButton>
        ) : null}
        {may.includes("sport.write") && book.status === "on" ? (
          <Button size="small" onClick={onAdd}>
            Add a session
          </Button>
        ) : null}
        {may.includes("camps.bout") ? (
          <Button size="small" variant="primary" onClick={onBout}>
            Change the bout
          </Button>
        ) : null}
      </div>
    </header>
  );
}
