import type { CampBook } from "@/lib/schemas/camp-book";
import { Lane, Rope } from "./lane";

const HEIGHT = 30;

/** The weight limit of the bout; where no weight is known it stands alone. */
export function WeightLane({ book }: { readonly book: CampBook }) {
  const limit = book.bout.limitKg;
  return (
    <Lane
      title="Weight"
      unit={limit === null ? "no limit set" : `kg to ${limit.toFixed(1)}`}
      height={HEIGHT}
      over={
        <span className="absolute top-1.5 left-2 text-2xs text-ink-2">
          {limit === null ? "The bout has no limit." : "No weights yet."}
        </span>
      }
    >
      {limit === null ? null : <Rope height={HEIGHT} className="stroke-blue" />}
    </Lane>
  );
}
