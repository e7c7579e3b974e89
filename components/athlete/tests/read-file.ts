import Papa from "papaparse";
import { TEST_SPECS } from "@/lib/engine/measures/test-kinds";
import { csvText } from "@/lib/format/csv";
import { readNumber, toKg, type MassUnit } from "@/lib/format/load";
import { TRIAL_KINDS, trialFormSchema, type TrialForm } from "@/lib/schemas/test-trial";

/** What a row of a file can say of a trial. */
export const TRIAL_COLUMNS = ["day", "kind", "side", "value", "second", "massKg", "note"] as const;
export type TrialColumn = (typeof TRIAL_COLUMNS)[number];

export const COLUMN_WORDS: Readonly<Record<TrialColumn, string>> = {
  day: "Date",
  kind: "Test",
  side: "Side",
  value: "Value",
  second: "Second",
  massKg: "Body mass",
  note: "Note",
};

/** Place of each column in the file; null where the file has none. */
export type ColumnMap = Readonly<Record<TrialColumn, number | null>>;

export interface FileTable {
  readonly head: readonly string[];
  readonly rows: readonly (readonly string[])[];
}

/** How dates and masses are written in the file, as the reader says: 03/04 has no right reading of its own. */
export interface FileHabits {
  readonly dates: "iso" | "day-first";
  readonly masses: MassUnit;
}

/** Text of a file: UTF-8, or what spreadsheets of Western Europe write where it is not. */
export function textOf(bytes: ArrayBuffer): string {
  try {
    return new TextDecoder("utf-8", { fatal: true }).decode(bytes);
  } catch {
    return new TextDecoder("windows-1252").decode(bytes);
  }
}

/** Head and rows of a CSV text; comma, semicolon or tab between the cells. Empty lines are left out. */
export function tableOf(text: string): FileTable {
  const { data } = Papa.parse<string[]>(text.replace(/^\uFEFF/, ""), {
    skipEmptyLines: "greedy",
    delimitersToGuess: [",", ";", "\t"],
  });
  const [head = [], ...rows] = data;
  return { head: head.map((cell) => cell.trim()), rows };
}

const GUESSES: Readonly<Record<TrialColumn, RegExp>> = {
  day: /^(date|day|datum|tested on)\b/i,
  kind: /^(test|kind)\b/i,
  side: /^(side|leg|arm)\b/i,
  value: /^(value|result|height|flight|distance)(?! unit)/i,
  second: /^(second|contact|load|ball)(?! unit)/i,
  massKg: /^(body ?mass|mass|body ?weight|weight)/i,
  note: /^(note|comment|remark)/i,
};

/** Which column of the file is which, by its head; each column of the file is used once. */
export function guessColumns(head: readonly string[]): ColumnMap {
  const taken = new Set<number>();
  const found = TRIAL_COLUMNS.map((column) => {
    const index = head.findIndex((cell, at) => !taken.has(at) && GUESSES[column].test(cell));
    if (index >= 0) taken.add(index);
    return [column, index < 0 ? null : index] as const;
  });
  return Object.fromEntries(found) as Record<TrialColumn, number | null>;
}

/** YYYY-MM-DD of a date as written; what cannot be read stays as it is, for the schema to refuse. */
function dayOf(text: string, dates: FileHabits["dates"]): string {
  if (dates === "iso") return text;
  const [, day = "", month = "", year = ""] = /^(\d{1,2})[./-](\d{1,2})[./-](\d{4})$/.exec(text) ?? [];
  return year === "" ? text : `${year}-${month.padStart(2, "0")}-${day.padStart(2, "0")}`;
}

const plainText = (text: string): string =>
  text
    .toLowerCase()
    .replace(/[\s_-]+/g, " ")
    .trim();

const kindOf = (text: string): string =>
  TRIAL_KINDS.find((kind) =>
    [kind, TEST_SPECS[kind].title].some((name) => plainText(name) === plainText(text)),
  ) ?? text;

const SIDES: Readonly<Record<string, string>> = { "": "both", l: "left", r: "right", b: "both" };

export interface ReadRow {
  /** Number of the line in the file, the head being 1; lines inside of cells are not counted. */
  readonly line: number;
  readonly cells: Readonly<Record<TrialColumn, string>>;
  /** Null where something is wrong. */
  readonly trial: TrialForm | null;
  readonly errors: Readonly<Partial<Record<TrialColumn, string>>>;
}

const numberOf = (text: string): number => readNumber(text) ?? Number.NaN;

/** A row as a trial, or what is wrong with it, column by column. */
function readRow(row: readonly string[], line: number, map: ColumnMap, habits: FileHabits): ReadRow {
  const cells = Object.fromEntries(
    TRIAL_COLUMNS.map((column) => {
      const index = map[column];
      return [column, (index === null ? "" : (row[index] ?? "")).trim()];
    }),
  ) as Record<TrialColumn, string>;
  const kind = kindOf(cells.kind);
  const spec = TRIAL_KINDS.find((known) => known === kind);
  const inMass = spec !== undefined && TEST_SPECS[spec].second?.unit === "kg";
  const massOf = (text: string): number => toKg(numberOf(text), habits.masses);
  const parsed = trialFormSchema.safeParse({
    kind,
    side: SIDES[plainText(cells.side)] ?? plainText(cells.side),
    day: dayOf(cells.day, habits.dates),
    value: numberOf(cells.value),
    second: cells.second === "" ? null : inMass ? massOf(cells.second) : numberOf(cells.second),
    massKg: cells.massKg === "" ? null : massOf(cells.massKg),
    // The apostrophe that keeps an exported note from being a formula.
    note: cells.note.replace(/^'(?=[=+\-@\t\r\n])/, ""),
  });
  if (parsed.success) return { line, cells, trial: parsed.data, errors: {} };
  const errors: Partial<Record<TrialColumn, string>> = {};
  for (const { path, message } of parsed.error.issues) {
    const column = TRIAL_COLUMNS.find((known) => known === path[0]);
    if (column) errors[column] ??= message;
  }
  return { line, cells, trial: null, errors };
}

/** Every row of a file, read. */
export const readRows = (table: FileTable, map: ColumnMap, habits: FileHabits): ReadRow[] =>
  table.rows.map((row, index) => readRow(row, index + 2, map, habits));

/** The file to fill in: one example of each kind of test. */
export const templateText = (unit: MassUnit, day: string): string =>
  csvText(
    ["Date", "Test", "Side", "Value", "Second", `Body mass ${unit}`, "Note"],
    [
      [day, "Jump height", "both", 38.5, null, null, "cm"],
      [day, "Jump, flight time", "both", 560, null, null, "ms"],
      [day, "Reactive jump", "both", 520, 190, null, "flight ms, contact ms"],
      [day, "Loaded jump", "both", 25, 20, null, `cm, load ${unit}`],
      [day, "Medicine-ball throw", "left", 11.4, 3, null, `m, ball ${unit}`],
    ],
  );
