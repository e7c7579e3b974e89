import type { CampBook, CampHold } from "@/lib/schemas/camp-book";

/** The hold that stands on a day, YYYY-MM-DD; null where none does. */
export function holdOnDay(book: Pick<CampBook, "holds">, date: string): CampHold | null {
  return (
    book.holds.find(
      ({ from, to, liftedAt }) => liftedAt === undefined && from <= date && (to === null || date <= to),
    ) ?? null
  );
}
