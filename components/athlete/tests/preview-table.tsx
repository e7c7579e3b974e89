import { Cell, HeadCell, Table } from "@/components/ui/table";
import { COLUMN_WORDS, TRIAL_COLUMNS, type ReadRow } from "./read-file";

/** Rows that are shown; a file may have many more. */
const SHOWN = 50;

const isWrong = ({ errors }: ReadRow): boolean => Object.keys(errors).length > 0;

/** What the file says, row by row; what is wrong stands beside its cell. Where something is wrong, those rows alone. */
export function PreviewTable({ rows, wrong }: { readonly rows: readonly ReadRow[]; readonly wrong: number }) {
  const chosen = (wrong > 0 ? rows.filter(isWrong) : rows).slice(0, SHOWN);
  return (
    <div className="grid gap-1.5">
      <p role="status" className="text-sm font-semibold">
        {wrong > 0
          ? `${wrong} of ${rows.length} rows need another look; nothing is imported until they are right.`
          : `${rows.length} rows, all readable.`}
        {(wrong || rows.length) > SHOWN ? ` The first ${SHOWN} are shown.` : ""}
      </p>
      <Table caption="Rows of the file" className="max-h-80 overflow-y-auto">
        <thead>
          <tr>
            <HeadCell>Row</HeadCell>
            {TRIAL_COLUMNS.map((column) => (
              <HeadCell key={column}>{COLUMN_WORDS[column]}</HeadCell>
            ))}
          </tr>
        </thead>
        <tbody>
          {chosen.map((row) => (
            <tr key={row.line} className="align-top">
              <HeadCell scope="row">{row.line}</HeadCell>
              {TRIAL_COLUMNS.map((column) => (
                <Cell key={column}>
                  {row.cells[column]}
                  {row.errors[column] ? (
                    <span className="block text-xs font-semibold text-red-text">{row.errors[column]}</span>
                  ) : null}
                </Cell>
              ))}
            </tr>
          ))}
        </tbody>
      </Table>
    </div>
  );
}
