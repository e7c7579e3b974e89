import { describe, expect, it } from "vitest";
import { lineEditOf, textsOf, withLine, withNote } from "@/components/session-page/edit-value";
import { editText, setText } from "@/components/session-page/words";
import { SMALLEST, fittingSize } from "@/components/sheet/fit";
import { dayFromIso } from "@/lib/engine";
import type { Kg } from "@/lib/engine/types";
import {
  fromKg,
  loadText,
  massText,
  readNumber,
  repsText,
  restText,
  toKg,
  workText,
} from "@/lib/format/load";
import { bestText } from "@/lib/format/best";
import type { LineView } from "@/lib/schemas/prescription";

const LINE: LineView = {
  slot: "main-lower",
  purpose: "Heavy legs",
  exercise: "back-squat",
  name: "Back squat",
  aim: "heavy",
  sets: 4,
  reps: { low: 5, high: 5 },
  sides: "both",
  intent: "controlled",
  tempo: "",
  load: { of: "reserve", reserve: { low: 2, high: 3 }, kg: 100 as Kg },
  rest: 150,
  cues: [],
  reasons: [],
  edited: [],
  note: null,
  alternatives: [],
  swappedFrom: null,
  swaps: [],
  planned: null,
};

describe("loads in words", () => {
  it("are kilograms or pounds, quarters kept", () => {
    expect([massText(102.5, "kg"), massText(101.25, "kg"), massText(124.667, "kg")]).toEqual([
      "102.5 kg",
      "101.25 kg",
      "124.7 kg",
    ]);
    // 225 lb at 0.45359237 kg a pound, exact by the agreement of 1959.
    expect(massText(225 * 0.45359237, "lb")).toBe("225 lb");
    for (const pounds of [2.5, 45, 97.5, 405]) expect(fromKg(toKg(pounds, "lb"), "lb")).toBe(pounds);
  });

  it("say where a best comes from", () => {
    const day = dayFromIso("2026-11-03");
    const best = { exercise: "back-squat", day, kg: 124.667 as Kg, from: "epley" } as const;
    expect(bestText(best, { kg: 110, reps: 4 }, "kg")).toBe(
      "124.7 kg, estimated by Epley from 110 kg × 4 on Tue 3 Nov",
    );
    expect(bestText({ ...best, from: "measured" }, null, "kg")).toBe("124.7 kg, measured on Tue 3 Nov");
  });

  it("say work, reserve and rest", () => {
    expect(workText(LINE)).toBe("4 × 5");
    expect(repsText({ ...LINE, aim: "hold", reps: { low: 20, high: 30 }, sides: "each" })).toBe(
      "20 to 30 s a side",
    );
    expect(loadText(LINE.load, "kg")).toBe("100 kg, 2 to 3 in reserve");
    expect(loadText({ of: "percent", percent: { low: 80, high: 85 } }, "kg")).toBe("80 to 85 % of best");
    expect([restText(45), restText(120), restText(150)]).toEqual(["45 s", "2 min", "2 min 30 s"]);
    expect([readNumber("102,5"), readNumber(" "), readNumber("x")]).toEqual([102.5, null, null]);
  });
});

describe("a coach's edit of a line", () => {
  it("says what it was beside what it is, and nothing for a note alone", () => {
    const planned = {
      ...LINE,
      sets: 5,
      load: { of: "reserve", reserve: { low: 2, high: 3 }, kg: null },
    } as const;
    expect(editText({ ...LINE, edited: ["sets", "kg", "note"], planned }, "kg")).toBe(
      "Coach: 4 sets, was 5; 100 kg, 2 to 3 in reserve, was 2 to 3 in reserve",
    );
    expect(editText({ ...LINE, edited: ["note"], planned }, "kg")).toBeNull();
    expect(editText({ ...LINE, edited: ["sets", "kg"] }, "kg")).toBe("Coach wrote sets, load");
  });

  it("keeps what is left empty as planned, and exact kilograms that were not touched", () => {
    const before = { kg: 225 * 0.45359237 + 1e-7, sets: 3 };
    const texts = textsOf(before, "lb");
    expect(texts).toMatchObject({ sets: "3", load: "225", exercise: "", low: "", note: "" });
    expect(lineEditOf(texts, before, "lb")).toEqual(before);
    expect(lineEditOf({ ...texts, sets: "", load: "", low: "6" }, before, "lb")).toEqual({
      reps: { low: 6, high: 6 },
    });
  });

  it("leaves the other lines and the session's note alone", () => {
    const edit = { lines: { a: { sets: 3 }, b: { sets: 2 } }, note: "Slow." };
    expect(withLine(edit, "a", null)).toEqual({ lines: { b: { sets: 2 } }, note: "Slow." });
    expect(withLine(edit, "a", { kg: 50 })).toEqual({
      lines: { a: { kg: 50 }, b: { sets: 2 } },
      note: "Slow.",
    });
    expect(withNote(edit, " ")).toEqual({ lines: edit.lines });
    expect(withLine(null, "a", { sets: 1 })).toEqual({ lines: { a: { sets: 1 } } });
  });
});

it("a logged set reads as it was done", () => {
  const set = { slot: "a", number: 1, exerciseId: "x", kg: 80, reps: 5, reserve: 2 };
  expect(setText(set, false, "kg")).toBe("80 kg × 5, 2 in reserve");
  expect(setText({ ...set, kg: null, reserve: null, reps: 30 }, true, "kg")).toBe("30 s");
});

it("the sheet takes the largest type that fits, and the smallest where none does", () => {
  expect(fittingSize((size) => size <= 7.1)).toBe(7);
  expect(fittingSize(() => false)).toBe(SMALLEST);
});
