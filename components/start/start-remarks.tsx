import { Notice } from "@/components/ui/notice";
import type { Plan } from "@/lib/engine/types";
import { remarkLines } from "./remark-lines";

/** More lines than these are folded: the camp stays in sight. */
const SHOWN = 3;

const Lines = ({ lines }: { readonly lines: readonly string[] }) => (
  <ul className="mt-1 grid gap-1">
    {lines.map((line) => (
      <li key={line}>{line}</li>
    ))}
  </ul>
);

/** What the planner could not do, in words. */
export function StartRemarks({ plan }: { readonly plan: Plan }) {
  const lines = remarkLines(plan);
  if (lines.length === 0) return null;
  return (
    <Notice
      tone="caution"
      title={lines.length === 1 ? "One thing does not fit" : `${lines.length} things do not fit`}
      className="mt-3"
    >
      <Lines lines={lines.slice(0, SHOWN)} />
      {lines.length > SHOWN ? (
        <details className="mt-1">
          <summary className="flex min-h-control-small items-center font-semibold underline underline-offset-4">
            {lines.length - SHOWN} more
          </summary>
          <Lines lines={lines.slice(SHOWN)} />
        </details>
      ) : null}
    </Notice>
  );
}
