import { isPreview, planBook, previewChange, type Preview } from "@/lib/book";
import type { LiveChange } from "@/components/camp/desk-state";
import { pictureOf, type Picture } from "@/components/camp/picture";
import type { Instant } from "@/lib/engine/types";
import { POLICY, type Action } from "@/lib/policy";
import type { CampBook } from "@/lib/schemas/camp-book";
import type { CampView } from "@/lib/schemas/camp";
import { campBook } from "../factories/camp-book";

/** Friday 20 November 2026, 12:00 UTC: the camp's sixth day. */
export const NOW = (Date.parse("2026-11-20T12:00:00Z") / 60_000) as Instant;

export const ALL = Object.keys(POLICY) as Action[];

export function campView(book: CampBook = campBook()): CampView {
  const { plan, input } = planBook(book, NOW);
  return {
    id: "camp",
    revision: 1,
    changedAt: "2026-11-20T12:00:00Z",
    athlete: { id: "athlete", name: "Tamsin Velloso" },
    book,
    plan,
    sport: input.sport,
    weights: [],
    may: ALL,
    others: ["athlete", "strength", "skills", "medic"],
  };
}

export const standing = (book?: CampBook): Picture => pictureOf(campView(book));

export function preview(picture: Picture, change: LiveChange): Preview {
  const result = previewChange(picture, change, NOW);
  if (!isPreview(result)) throw new Error(result.problems[0]?.message);
  return result;
}
