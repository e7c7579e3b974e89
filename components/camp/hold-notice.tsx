import { Notice } from "@/components/ui/notice";
import { holdOnDay } from "@/lib/book/hold-on-day";
import { dayFromIso, isoFromDay } from "@/lib/engine/geometry";
import type { Day } from "@/lib/engine/types";
import { dayText } from "@/lib/format/civil";
import type { CampBook } from "@/lib/schemas/camp-book";

interface HoldNoticeProps {
  readonly book: CampBook;
  readonly today: Day;
}

/** A hold that is on: what it stops, and who lifts it. Its reason is the medic's. */
export function HoldNotice({ book, today }: HoldNoticeProps) {
  const date = isoFromDay(today);
  const hold = holdOnDay(book, date);
  if (!hold) return null;
  return (
    <Notice title={`On a hold since ${dayText(dayFromIso(hold.from))}`} className="mb-3">
      No sparring and no lifting is planned{" "}
      {hold.to === null ? "until the medic lifts it" : `up to ${dayText(dayFromIso(hold.to))}`}. This is no
      medical clearance.
    </Notice>
  );
}
