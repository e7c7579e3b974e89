import type { CampBook } from "@/lib/schemas/camp-book";
import { Lane, Rope } from "./lane";

const HEIGHT = 30;

/** The weight limit of the bout. Weights and the line to it stand on the athlete’s page, not here. */
export function WeightLane({ book }: { readonly book: CampBook }) {
  const limit = book.bout.limitKg;
  return (
    <Lane
      title="Weight"
      unit={limit === null ? "no limit set" : `kg to ${limit.toFixed(1)}`}
      height={HEIGHT}
      over={
        <span className="absolute top-1.5 left-2 text-2xs text-ink-2">
          {limit === null
            ? "The bout has no limit."
            : "Weights against the line stand on the athlete’s page."}
        </span>
      }
    >
      {limit === null ? null : <Rope height={HEIGHT} className="stroke-blue" />}
    </Lane>
  );
}
