import { Notice } from "@/components/ui/notice";
import { formatInstant } from "@/lib/format/dates";
import type { MissedChange } from "@/lib/query/camps";

interface MissedChangesProps {
  readonly missed: readonly MissedChange[];
  readonly zone: string;
}

/** Who changed what while this change was being tried; its effects are measured against the new state already. */
export function MissedChanges({ missed, zone }: MissedChangesProps) {
  if (missed.length === 0) return null;
  return (
    <Notice role="alert" tone="caution" title="Changed by someone else meanwhile" className="mx-4 mb-3">
      <ul className="mt-1 grid gap-1">
        {missed.map((change) => (
          <li key={change.number}>
            <b className="font-semibold">{change.by}</b>, {formatInstant(new Date(change.at), zone)}:{" "}
            {change.summary}
          </li>
        ))}
      </ul>
      <p className="mt-1.5">Below is what your change does to the camp as it stands now. It is not saved.</p>
    </Notice>
  );
}
