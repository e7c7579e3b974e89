import { describe, expect, it } from "vitest";
import {
  guessColumns,
  readRows,
  tableOf,
  templateText,
  textOf,
  type FileHabits,
} from "@/components/athlete/tests/read-file";
import { csvText } from "@/lib/format/csv";

const ISO: FileHabits = { dates: "iso", masses: "kg" };

function read(text: string, habits = ISO) {
  const table = tableOf(text);
  return readRows(table, guessColumns(table.head), habits);
}

describe("a file of trials", () => {
  it("is read with commas, semicolons and tabs between the cells, with point and comma in the numbers", () => {
    const files = [
      "Date,Test,Side,Value\n2026-11-02,Jump height,left,38.5\n",
      "Date;Test;Side;Value\r\n2026-11-02;Jump height;left;38,5\r\n",
      "Date\tTest\tSide\tValue\n2026-11-02\tjump-height\tL\t38,5",
      'Date,Test,Side,Value\n2026-11-02,"Jump height",LEFT,"38,5"\n\n',
    ];
    for (const file of files) {
      const rows = read(file);
      expect([file, rows.map(({ trial }) => trial)]).toEqual([
        file,
        [
          {
            kind: "jump-height",
            side: "left",
            day: "2026-11-02",
            value: 38.5,
            second: null,
            massKg: null,
            note: "",
          },
        ],
      ]);
    }
  });

  it("dates are read as the reader says: 3/4/2026, day first, is 3 April, and without that it is no date", () => {
    const file =
      "Date,Test,Value\n3/4/2026,Jump height,40\n03.04.2026,Jump height,40\n31/2/2026,Jump height,40\n";
    const dayFirst = read(file, { ...ISO, dates: "day-first" });
    expect(dayFirst.map(({ trial }) => trial?.day)).toEqual(["2026-04-03", "2026-04-03", undefined]);
    expect(dayFirst[2]?.errors).toEqual({ day: "Give a date as YYYY-MM-DD." });
    expect(read(file).map(({ errors }) => Object.keys(errors))).toEqual([["day"], ["day"], ["day"]]);
  });

  it("what is wrong stands with its row and its column", () => {
    const rows = read(
      "Date,Test,Side,Value,Contact\n2026-11-02,Jump height,both,385,\n2026-11-02,Hop,both,20,\n2026-11-02,Reactive jump,both,500,\n2026-11-02,Jump height,middle,high,\n",
    );
    expect(rows.map(({ line, trial }) => [line, trial])).toEqual([
      [2, null],
      [3, null],
      [4, null],
      [5, null],
    ]);
    expect(rows[0]?.errors).toEqual({ value: "Height: 3 to 120 cm." });
    expect(rows[1]?.errors).toEqual({ kind: "Choose a test." });
    expect(rows[2]?.errors).toEqual({ second: "Contact time: 80 to 800 ms." });
    expect(Object.keys(rows[3]?.errors ?? {}).sort()).toEqual(["side", "value"]);
  });

  it("pounds are turned into kilograms where they are masses, and contact times are not", () => {
    const rows = read(
      "Date,Test,Value,Second,Body mass\n2026-11-02,Loaded jump,25,44.0925,176.37\n2026-11-02,Reactive jump,500,200,\n",
      { ...ISO, masses: "lb" },
    );
    expect(rows[0]?.trial?.second).toBeCloseTo(20, 4);
    expect(rows[0]?.trial?.massKg).toBeCloseTo(80, 2);
    expect(rows[1]?.trial?.second).toBe(200);
  });

  it("the template reads back without an error, its columns guessed", () => {
    const rows = read(templateText("kg", "2026-11-02"));
    expect(rows.length).toBeGreaterThanOrEqual(5);
    expect(rows.filter(({ trial }) => trial === null)).toEqual([]);
  });

  it("an exported note that begins like a formula comes back as it was", () => {
    const head = [
      "Date",
      "Test",
      "Side",
      "Value",
      "Second",
      "Body mass kg",
      "Note",
      "Value unit",
      "Second unit",
    ];
    const text = csvText(head, [
      ["2026-11-02", "Jump height", "both", 40, null, null, '=1+1, "x" 🥊', "cm", null],
    ]);
    expect(read(text)[0]?.trial?.note).toBe('=1+1, "x" 🥊');
  });

  it("text that is no UTF-8 is read as Western European", () => {
    const bytes = new Uint8Array([0x4e, 0x6f, 0x74, 0xe9]);
    expect(textOf(bytes.buffer)).toBe("Noté");
    expect(textOf(new TextEncoder().encode("Noté").buffer as ArrayBuffer)).toBe("Noté");
  });

  it("no column of the file is taken twice, and none is guessed from nothing", () => {
    expect(guessColumns(["a", "b"])).toEqual({
      day: null,
      kind: null,
      side: null,
      value: null,
      second: null,
      massKg: null,
      note: null,
    });
    const map = guessColumns(["Mass", "Load", "Tested on", "Result", "Test", "Leg", "Remarks"]);
    expect(map).toEqual({ massKg: 0, second: 1, day: 2, value: 3, kind: 4, side: 5, note: 6 });
  });
});
