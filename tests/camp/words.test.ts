import { describe, expect, it } from "vitest";
import { boutLine, daysOutText } from "@/components/camp/bout-line";
import { changeHeading, effectMove, saveText } from "@/components/camp/rail/words";
import { respondText, toldText } from "@/components/camp/words";
import { dayFromIso, minuteFromHhmm } from "@/lib/engine";
import type { Day, LiftEffect } from "@/lib/engine/types";
import { campBook } from "../factories/camp-book";
import { preview, standing } from "./scene";

const place = (date: string, start: string) => ({ day: dayFromIso(date), start: minuteFromHhmm(start) });

describe("the rail's words", () => {
  it("says from which day to which a session moves", () => {
    const heading = changeHeading(
      { kind: "sport.edit", sportId: "sat@2026-12-05", scope: "this", values: { date: "2026-12-03" } },
      standing(),
    );
    expect(heading).toBe("Moving Hard sparring from Saturday 5 to Thursday 3");
  });

  it("says the scope and the times where they matter", () => {
    const heading = changeHeading(
      { kind: "sport.edit", sportId: "sat@2026-12-05", scope: "following", values: { start: "12:30" } },
      standing(),
    );
    expect(heading).toBe("Moving Hard sparring and those after it on Saturday 5 from 11:00 to 12:30");
  });

  it.each([
    [0, "Save"],
    [1, "Save and tell 1 person"],
    [3, "Save and tell 3 people"],
  ])("says on the button whom saving tells: %i", (people, text) => {
    expect(saveText(people)).toBe(text);
  });

  it("says afterwards how many are being told", () => {
    expect(toldText(3)).toBe("Saved. 3 people are being told.");
    expect(toldText(0, "Put back")).toBe("Put back. Nobody else had to be told.");
  });

  it("counts what responds without the session that is moved", () => {
    const picture = standing();
    const lift = picture.plan.lifts.findLast((candidate) => !candidate.past);
    if (!lift) throw new Error("No lift ahead.");
    const { knockOn } = preview(picture, { kind: "lift.factor", liftId: lift.id, factor: 1 });
    expect(respondText(knockOn, lift.id)).toBe("Nothing else in the camp changes.");
  });

  it.each<[string, Partial<LiftEffect>, string]>([
    [
      "to another day",
      { kind: "moved", from: place("2026-12-02", "10:00"), to: place("2026-11-30", "10:00") },
      "Wed 2 → Mon 30",
    ],
    [
      "to another time",
      { kind: "moved", from: place("2026-12-02", "10:00"), to: place("2026-12-02", "15:00") },
      "Wed 2, 10:00 → 15:00",
    ],
    [
      "in its sets alone",
      { kind: "dose", from: place("2026-12-04", "10:00"), to: place("2026-12-04", "10:00") },
      "stays Fri 4",
    ],
    [
      "out of the week",
      { kind: "unplaced", from: place("2026-12-02", "10:00"), to: null },
      "was Wed 2, has no place now",
    ],
  ])("says how a lift changes: %s", (_, effect, text) => {
    expect(
      effectMove({
        id: "x",
        item: "strength-a",
        setsBefore: 1,
        setsAfter: 1,
        because: [],
        from: null,
        to: null,
        kind: "dose",
        ...effect,
      }),
    ).toBe(text);
  });
});

describe("the head of the camp", () => {
  it("gives the facts of the bout in one line", () => {
    const { when, rest } = boutLine(campBook());
    expect(when + rest).toBe(
      "Sat 9 January 2027, 20:30 at Ellery Hall · Kickboxing 3 × 3 · 60 kg, weigh-in Fri 8 Jan 11:00 · 8-week camp",
    );
  });

  it("names the venue's clock where the gym lives by another", () => {
    const book = campBook();
    expect(boutLine({ ...book, bout: { ...book.bout, timeZone: "America/New_York" } }).rest).toContain(
      "20:30 (New York time)",
    );
  });

  it.each([
    [38, "38", ["days", "out"]],
    [1, "1", ["day", "out"]],
    [0, "0", ["bout", "today"]],
    [-3, "3", ["days", "since"]],
  ])("counts days out: %i", (out, count, words) => {
    expect(daysOutText((20_000 + out) as Day, 20_000 as Day)).toEqual({ count, words });
  });
});
