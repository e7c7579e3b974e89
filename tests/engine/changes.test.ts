import { describe, expect, it } from "vitest";
import {
  instantAt,
  knockOn,
  plan,
  type Base,
  type Day,
  type Instant,
  type Minute,
  type Plan,
  type PlanInput,
  type SportSession,
} from "@/lib/engine";
import { day, minute, planInput } from "../factories/plan-input";

const baseOf = (made: Plan): Base => ({ boutDay: made.bout.day, lifts: made.lifts });
const EMPTY = { lifts: [], sport: [], weeks: [], violations: [], bout: null };

const input = planInput();
const stood = plan(input);
const effects = (changed: PlanInput, base: Base = baseOf(stood)) =>
  knockOn({ plan: stood, sport: input.sport }, { plan: plan(changed, base), sport: changed.sport });

const move = (from: string, to: string, start: string): PlanInput => ({
  ...input,
  sport: input.sport.map((session): SportSession =>
    session.day === day(from) && session.kind === "hard-sparring"
      ? { ...session, day: day(to), start: minute(start) }
      : session,
  ),
});

describe("a hard sparring day that moves", () => {
  const changed = move("2026-12-05", "2026-12-03", "18:00");
  const known = effects(changed);

  it("is listed as one move of that session", () => {
    expect(known.sport).toEqual([
      expect.objectContaining({
        kind: "moved",
        sport: "hard-sparring",
        from: { day: day("2026-12-05"), start: minute("11:00"), minutes: 60 },
        to: { day: day("2026-12-03"), start: minute("18:00"), minutes: 60 },
      }),
    ]);
    expect(known.bout).toBeNull();
    expect(known.violations).toEqual([]);
  });

  it("lifts around it follow, each with the rule or factor that caused it, in sentences and in order of days", () => {
    expect(known.lifts.length).toBeGreaterThan(0);
    for (const effect of known.lifts) {
      expect(effect.because.length).toBeGreaterThan(0);
      for (const { text } of effect.because) expect(text).toMatch(/^[A-Z0-9].*\.$/);
      expect(["moved", "dose"]).toContain(effect.kind);
    }
    const days = known.lifts.map((effect) => effect.to?.day ?? 0);
    expect(days).toEqual([...days].sort((a, b) => a - b));
  });

  it("a changed dose names the factor and both values", () => {
    const dosed = known.lifts.find(({ setsBefore, setsAfter }) => setsBefore !== setsAfter);
    expect(dosed?.because.some(({ text }) => /: × [\d.]+ instead of × [\d.]+\.$/.test(text))).toBe(true);
  });

  it("weeks whose sets change are listed with their causes, others are not", () => {
    const made = plan(changed, baseOf(stood));
    for (const week of stood.weeks) {
      const now = made.weeks.find((row) => row.weeksOut === week.weeksOut)?.sets;
      const effect = known.weeks.find((row) => row.weeksOut === week.weeksOut);
      if (now === week.sets) expect(effect).toBeUndefined();
      else expect(effect).toMatchObject({ setsBefore: week.sets, setsAfter: now });
    }
    for (const week of known.weeks) expect(week.because.length).toBeGreaterThan(0);
  });

  it("moved back inside the preview, nothing is left of it", () => {
    expect(effects(move("2026-12-05", "2026-12-05", "11:00"))).toEqual(EMPTY);
  });
});

describe("what else can change", () => {
  it("nothing: no effect", () => {
    expect(effects(input)).toEqual(EMPTY);
  });

  it("a third hard day takes the least important lift off, and says so", () => {
    const third = {
      ...input.sport[0],
      id: "third",
      kind: "hard-sparring",
      title: "Rounds",
      day: day("2026-12-03"),
      start: minute("18:00"),
    };
    const known = effects({ ...input, sport: [...input.sport, third as SportSession] });
    expect(known.lifts).toContainEqual(
      expect.objectContaining({
        item: "trunk-and-kick",
        kind: "dropped",
        to: null,
        because: [{ rule: "hard-days.off", text: "3 days of hard sparring that week take one lift off." }],
      }),
    );
    expect(known.sport).toMatchObject([{ id: "third", kind: "added", from: null }]);
  });

  it("a session that is taken out or only edited is listed as that; a load that was answered for is not", () => {
    const [first, second, third, ...rest] = input.sport;
    if (!first || !second || !third) throw new Error("no sport");
    const sport = [
      { ...second, title: "Open mat" },
      { ...third, doneLoad: 500 as NonNullable<SportSession["doneLoad"]> },
      ...rest,
    ];
    const known = effects({ ...input, sport });
    expect(known.sport.map(({ id, kind }) => ({ id, kind }))).toEqual([
      { id: first.id, kind: "dropped" },
      { id: second.id, kind: "edited" },
    ]);
  });

  it("a pin: the session moves because the coach said so, and what it breaks is new in the violations", () => {
    const lift = stood.lifts.find(({ item, week }) => item === "strength-a" && week === 5);
    if (!lift) throw new Error("no strength A");
    const pin = {
      id: lift.id,
      slot: { item: lift.item, week: lift.week },
      day: day("2026-12-04"),
      start: minute("12:00"),
    };
    const known = effects({ ...input, pins: [pin] });
    expect(known.lifts.find(({ id }) => id === lift.id)).toMatchObject({
      kind: "moved",
      from: { day: lift.day, start: lift.start },
      to: { day: pin.day, start: pin.start },
      because: expect.arrayContaining([{ rule: "pin", text: "Pinned by the coach." }]),
    });
    expect(known.violations.map(({ rule }) => rule)).toContain("heavy-before-hard");
  });

  it("no free hours left: sessions become unplaced, with the rules that shut them", () => {
    const known = effects({ ...input, athlete: { ...input.athlete, freeHours: [] } });
    expect(known.lifts).toHaveLength(stood.lifts.length);
    for (const effect of known.lifts) {
      expect(effect).toMatchObject({ kind: "unplaced", to: null, setsAfter: null });
      expect(effect.because[0]?.rule).toBe("free-hours");
    }
    expect(known.weeks.every((week) => week.setsAfter === 0)).toBe(true);
  });

  it("a lift more a week: added, with its item's title in reach", () => {
    const known = effects({ ...input, athlete: { ...input.athlete, liftsPerWeek: 4 } });
    const added = known.lifts.filter(({ kind }) => kind === "added");
    expect(added.map(({ item }) => item)).toContain("power-touch");
    for (const effect of added) expect(effect).toMatchObject({ from: null, setsBefore: null });
  });
});

describe("a bout that moves", () => {
  const moved = (days: number): PlanInput => ({
    ...input,
    bout: { day: (input.bout.day + days) as Day, start: input.bout.start },
    weighIn: null,
  });
  const kept = (later: Plan) => {
    const before = new Map(stood.lifts.map((lift) => [lift.id, lift]));
    return later.lifts.flatMap((lift) => {
      const was = before.get(lift.id);
      return was ? [{ was, lift }] : [];
    });
  };

  it.each([1, 3, 7, 10, -3, -7])(
    "by %i days: sessions keep their identity, item and neighbourhood",
    (days) => {
      const later = plan(moved(days), baseOf(stood));
      expect(kept(later).length).toBeGreaterThanOrEqual(later.lifts.length / 2);
      for (const { was, lift } of kept(later)) {
        expect(lift.item).toBe(was.item);
        expect(Math.abs(lift.day - was.day)).toBeLessThanOrEqual(13);
      }
      expect(effects(moved(days)).bout).toEqual({ from: stood.bout, to: later.bout });
    },
  );

  it("by a day: most sessions stay on the very day they had", () => {
    const pairs = kept(plan(moved(1), baseOf(stood)));
    expect(pairs.filter(({ was, lift }) => was.day === lift.day).length).toBeGreaterThan(pairs.length / 2);
  });

  it("and back: the same sessions under the same names at the same places", () => {
    const restored = plan(input, { boutDay: input.bout.day, lifts: stood.lifts });
    expect(restored.lifts).toEqual(stood.lifts);
  });

  it("later, half way through: what is past keeps its day, its sets and its name, and no new session takes that name", () => {
    const now = instantAt(input.zone, day("2026-12-10"), minute("12:00"));
    const later = plan({ ...moved(14), now }, baseOf(stood));
    const past = stood.lifts.filter((lift) => instantAt(input.zone, lift.day, lift.start) <= now);
    expect(past.length).toBeGreaterThan(6);
    for (const { id, day: at, start, sets, factors } of past) {
      expect(later.lifts.find((lift) => lift.id === id)).toMatchObject({
        day: at,
        start,
        sets,
        factors,
        past: true,
      });
    }
    expect(new Set(later.lifts.map((lift) => lift.id)).size).toBe(later.lifts.length);
    const sparring = knockOn({ plan: stood, sport: input.sport }, { plan: later, sport: input.sport });
    expect(sparring.sport).toEqual([]);
  });

  it("earlier: sessions beyond it are dropped because of it", () => {
    const known = effects({ ...moved(-14), weeks: 6 });
    expect(known.lifts.filter(({ kind }) => kind === "dropped").length).toBeGreaterThan(0);
    expect(known.bout?.to.day).toBe(input.bout.day - 14);
  });
});

describe("half way through a week", () => {
  const wednesday = instantAt(input.zone, day("2026-12-02"), minute("21:00"));

  it("what was lifted fills its slot: the week still holds three lifts", () => {
    const made = plan({ ...input, now: wednesday }, baseOf(stood));
    expect(made.lifts.filter((lift) => lift.week === 5)).toHaveLength(3);
    expect(made.lifts.filter((lift) => lift.week === 5 && lift.past).length).toBeGreaterThan(0);
  });

  it("within 36 h only a must rule moves a session", () => {
    const next = stood.lifts.find((lift) => instantAt(input.zone, lift.day, lift.start) > wednesday);
    if (!next) throw new Error("nothing ahead");
    const now = (instantAt(input.zone, next.day, next.start) - 20 * 60) as Instant;
    // Skill an hour later is a should rule's matter: the session stays. In its place is a must rule's: it goes.
    const beside = (start: number): PlanInput => ({
      ...input,
      now,
      sport: [
        ...input.sport,
        {
          id: "new",
          kind: "skill",
          title: "Pads",
          day: next.day,
          start: start as Minute,
          minutes: 60,
          effort: 4,
        },
      ],
    });
    const placeOf = (made: Plan) => made.lifts.find((lift) => lift.id === next.id);
    expect(placeOf(plan(beside(next.start + next.minutes + 90), baseOf(stood)))).toMatchObject({
      day: next.day,
      start: next.start,
    });
    const pushed = placeOf(plan(beside(next.start), baseOf(stood)));
    expect([pushed?.day, pushed?.start]).not.toEqual([next.day, next.start]);
  });

  it("made from scratch, days that are gone stay empty", () => {
    const made = plan({ ...input, now: wednesday });
    expect(made.lifts.every((lift) => instantAt(input.zone, lift.day, lift.start) > wednesday)).toBe(true);
    expect(made.unplaced.every((slot) => slot.week === 5)).toBe(true);
  });
});
