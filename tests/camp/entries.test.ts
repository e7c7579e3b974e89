import { describe, expect, it } from "vitest";
import { calendarEntries } from "@/components/camp/calendar/entry";
import { moveChange } from "@/components/camp/move-change";
import { pictureOfPreview } from "@/components/camp/picture";
import { dayFromIso, minuteFromHhmm } from "@/lib/engine";
import { ALL, NOW, preview, standing } from "./scene";

const desk = { now: NOW, may: ALL, hand: null, selected: null };
const place = (date: string, start: string) => ({ day: dayFromIso(date), start: minuteFromHhmm(start) });

describe("chips of the calendar", () => {
  it("draws every lift, every sport session and the weigh-in once", () => {
    const picture = standing();
    const entries = calendarEntries({ ...desk, shown: picture, preview: null });
    expect(entries).toHaveLength(picture.plan.lifts.length + picture.sport.length + 1);
    expect(new Set(entries.map((entry) => entry.id)).size).toBe(entries.length);
  });

  it("lets nothing past be moved, and says so", () => {
    const entries = calendarEntries({ ...desk, shown: standing(), preview: null });
    const past = entries.filter((entry) => entry.day < dayFromIso("2026-11-20"));
    expect(past.length).toBeGreaterThan(0);
    for (const entry of past) {
      expect(entry.movable).toBe(false);
      expect(entry.label).toContain("past");
    }
  });

  it("lets a role move only what its policy row allows", () => {
    const skills = calendarEntries({ ...desk, may: ["sport.write"], shown: standing(), preview: null });
    expect(skills.some((entry) => entry.source === "sport" && entry.movable)).toBe(true);
    expect(skills.some((entry) => entry.source === "lift" && entry.movable)).toBe(false);
    const athlete = calendarEntries({ ...desk, may: ["camps.read"], shown: standing(), preview: null });
    expect(athlete.some((entry) => entry.movable)).toBe(false);
  });

  it("draws a ghost where each moved session stood and an outline where it lands", () => {
    const picture = standing();
    const change = moveChange(picture, null, "sat@2026-12-05", place("2026-12-03", "18:00"));
    if (!change) throw new Error("No such session.");
    const tried = preview(picture, change);
    const entries = calendarEntries({ ...desk, shown: pictureOfPreview(tried), preview: tried });
    const moved = [...tried.knockOn.lifts, ...tried.knockOn.sport].filter(
      (effect) => effect.kind === "moved",
    );
    expect(moved.map((effect) => effect.id)).toContain("sat@2026-12-05");
    for (const effect of moved) {
      const ghost = entries.find((entry) => entry.id === `ghost:${effect.id}`);
      expect(ghost).toMatchObject({ day: effect.from?.day, state: { ghost: true }, movable: false });
      expect(entries.find((entry) => entry.id === effect.id)).toMatchObject({
        day: effect.to?.day,
        state: { moved: true },
      });
    }
  });

  it("marks a pin that breaks a must rule", () => {
    const picture = standing();
    const heavy = picture.plan.lifts.find((lift) => lift.item === "strength-a" && !lift.past);
    if (!heavy) throw new Error("No heavy lift ahead.");
    // Two hours before hard sparring.
    const change = moveChange(picture, null, heavy.id, place("2026-12-08", "15:00"));
    if (!change) throw new Error("No such lift.");
    const tried = preview(picture, change);
    const entries = calendarEntries({ ...desk, shown: pictureOfPreview(tried), preview: tried });
    const pinned = entries.find((entry) => entry.id === heavy.id);
    expect(pinned).toMatchObject({ state: { pinned: true, broken: true } });
    expect(pinned?.label).toContain("breaks a rule");
  });
});
