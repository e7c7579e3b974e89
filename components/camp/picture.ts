import { zoneOf } from "@/lib/book/camp-zone";
import { isPreview, type Preview, type PreviewResult } from "@/lib/book/preview-result";
import { instantAt } from "@/lib/engine/geometry";
import type { Day, Instant, Minute, OffsetStep, Plan, SportSession } from "@/lib/engine/types";
import type { CampBook } from "@/lib/schemas/camp-book";
import type { CampView } from "@/lib/schemas/camp";

/** Everything that the camp page draws: as saved, or as a change that is being tried would make it. */
export interface Picture {
  readonly book: CampBook;
  readonly plan: Plan;
  readonly sport: readonly SportSession[];
  readonly zone: readonly OffsetStep[];
}

export const pictureOf = (view: CampView): Picture => ({
  book: view.book,
  plan: view.plan,
  sport: view.sport,
  zone: zoneOf(view.book, view.sport),
});

export const pictureOfPreview = ({ book, plan, input }: Preview): Picture => ({
  book,
  plan,
  sport: input.sport,
  zone: input.zone,
});

/** What to draw: the preview where there is one that holds, else what is saved. */
export const shownPicture = (standing: Picture, preview: PreviewResult | null): Picture =>
  preview && isPreview(preview) ? pictureOfPreview(preview) : standing;

/** The saved view with a previewed change in it, until the server has answered. */
export const optimisticView = (view: CampView, { book, plan, input }: Preview): CampView => ({
  ...view,
  book,
  plan,
  sport: input.sport,
});

export const isPastAt = (
  zone: readonly OffsetStep[],
  at: { day: Day; start: Minute },
  now: Instant,
): boolean => instantAt(zone, at.day, at.start) <= now;
