import Link from "next/link";
import type { CampLine } from "@/lib/schemas/athlete-record";
import { dateText } from "../words";
import { Section } from "./section";

const RESULTS: Readonly<Record<NonNullable<CampLine["result"]>, string>> = {
  won: "won",
  lost: "lost",
  draw: "draw",
  "no-contest": "no contest",
};

/** Every camp of the athlete, the newest bout first. */
export const CampSection = ({ camps }: { readonly camps: readonly CampLine[] }) => (
  <Section id="camps" title="Camps">
    {camps.length === 0 ? (
      <p className="text-ink-2">None yet.</p>
    ) : (
      <ul className="divide-y divide-line-soft">
        {camps.map((camp) => (
          <li key={camp.id} className="py-2">
            <Link
              href={`/camps/${camp.id}`}
              className="inline-flex min-h-control-small items-center underline"
            >
              Bout on {dateText(camp.bout)}
              {camp.opponent ? ` against ${camp.opponent}` : ""}
            </Link>
            <span className="block text-sm text-ink-2">
              {[
                camp.place,
                `${camp.weeks} weeks`,
                camp.on ? null : "marked off",
                camp.result ? RESULTS[camp.result] : null,
              ]
                .filter(Boolean)
                .join(", ")}
            </span>
          </li>
        ))}
      </ul>
    )}
  </Section>
);
