import Papa from "papaparse";

/** Text is written as text, numbers as numbers; null is an empty cell. */
export type CsvCell = string | number | null;

/** Starts that make a spreadsheet read a cell as a formula. */
const FORMULA = /^[=+\-@\t\r\n]/;

/** Byte order mark: without it spreadsheets read UTF-8 as something else. */
const BOM = "\uFEFF";

/**
 * A CSV file: UTF-8 with BOM, CRLF, quoted by RFC 4180. A text that would be read as a formula (first character `=`, `+`, `-`,
 * `@`, tab or a line end) gets an apostrophe before it; numbers stay bare, minus sign included. OWASP, CSV injection; common
 * practice. The writer's own pattern for this misses texts of several lines, so ours is given to it.
 */
export const csvText = (head: readonly string[], rows: readonly (readonly CsvCell[])[]): string =>
  BOM +
  Papa.unparse([[...head], ...rows.map((row) => [...row])], { newline: "\r\n", escapeFormulae: FORMULA }) +
  "\r\n";
