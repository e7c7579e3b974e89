import { buttonLook } from "@/components/ui/button-look";
import type { CsvKind } from "@/lib/schemas/athlete-record";

/** Leads to all days of one kind as a file. A plain link: the browser keeps the file, no page is left. */
export const CsvLink = ({ athleteId, what }: { readonly athleteId: string; readonly what: CsvKind }) => (
  <a href={`/api/athletes/${athleteId}/csv/${what}`} download className={buttonLook({ size: "small" })}>
    CSV
    <span className="sr-only"> of {what}</span>
  </a>
);
