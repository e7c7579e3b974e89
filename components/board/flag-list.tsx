import type { BoardRow } from "@/lib/schemas/board";
import Link from "next/link";

/** What to look at, in words. Suggestions lead to where they are decided. */
export function FlagList({ row }: { readonly row: Pick<BoardRow, "flags" | "campId"> }) {
  if (row.flags.length === 0) return <p className="text-sm text-ink-2">Nothing to look at</p>;
  return (
    <ul aria-label="Flags" className="grid gap-0.5 text-sm">
      {row.flags.map(({ kind, text }) => (
        <li key={`${kind} ${text}`} className="border-l-2 border-ink-3 pl-2">
          {kind === "suggestions" ? (
            <Link
              href={`/camps/${row.campId}#waiting`}
              className="rounded font-semibold underline underline-offset-4"
            >
              {text}
            </Link>
          ) : (
            text
          )}
        </li>
      ))}
    </ul>
  );
}
