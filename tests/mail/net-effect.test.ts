import fc from "fast-check";
import { describe, expect, it } from "vitest";
import type { Day, LiftEffect, Minute, SportEffect, SportSession } from "@/lib/engine/types";
import { netLifts, netSport, type BurstRevision } from "@/lib/mail/net-effect";

const place = (day: number, start = 1080) => ({ day: day as Day, start: start as Minute });
const burstOf = (
  effects: readonly { lifts?: LiftEffect[]; sport?: SportEffect[]; told?: boolean }[],
): BurstRevision[] =>
  effects.map(({ lifts = [], sport = [], told = true }) => ({
    told,
    knockOn: { lifts, sport, weeks: [], violations: [], bout: null },
  }));

const lift = (over: Partial<LiftEffect>): LiftEffect => ({
  id: "strength-a.5",
  item: "strength-a",
  kind: "moved",
  from: place(1),
  to: place(2),
  setsBefore: 16,
  setsAfter: 16,
  because: [],
  ...over,
});
const sport = (over: Partial<SportEffect>): SportEffect => ({
  id: "sat",
  title: "Pads",
  sport: "skill",
  kind: "moved",
  from: { ...place(1), minutes: 60 },
  to: { ...place(2), minutes: 60 },
  ...over,
});
const session = (over: Partial<SportSession>): SportSession => ({
  id: "sat",
  kind: "skill",
  title: "Pads",
  ...place(1),
  minutes: 60,
  effort: 4,
  ...over,
});
const none = new Map<string, SportSession>();
const nowhere = new Set<string>();

describe("the net effect on a lift", () => {
  it("goes from where it first stood to where it last stands, and is nothing where these are one (2000 walks)", () => {
    const stop = fc.record({ day: fc.integer({ min: 0, max: 3 }), sets: fc.integer({ min: 8, max: 10 }) });
    fc.assert(
      fc.property(fc.array(stop, { minLength: 2, maxLength: 6 }), (stops) => {
        const steps = stops.slice(1).flatMap((to, index) => {
          const from = stops[index];
          return from
            ? [
                {
                  lifts: [
                    lift({
                      from: place(from.day),
                      to: place(to.day),
                      setsBefore: from.sets,
                      setsAfter: to.sets,
                    }),
                  ],
                },
              ]
            : [];
        });
        const [first, last] = [stops[0], stops.at(-1)];
        const net = netLifts(burstOf(steps), nowhere);
        if (first?.day === last?.day && first?.sets === last?.sets) expect(net).toEqual([]);
        else {
          expect(net).toHaveLength(1);
          expect(net[0]?.before).toEqual({ at: place(first?.day ?? -1), sets: first?.sets });
          expect(net[0]?.after).toEqual({ at: place(last?.day ?? -1), sets: last?.sets });
        }
      }),
      { numRuns: 2000, seed: 20261201 },
    );
  });

  it.each([
    [
      "added and taken out again: nothing",
      [
        lift({ kind: "added", from: null, setsBefore: null }),
        lift({ kind: "dropped", from: place(2), to: null, setsAfter: null }),
      ],
      [],
      [],
    ],
    [
      "taken out and added where it was: nothing",
      [
        lift({ kind: "dropped", to: null, setsAfter: null }),
        lift({ kind: "added", from: null, to: place(1), setsBefore: null }),
      ],
      [],
      [],
    ],
    [
      "lost its place",
      [lift({ kind: "unplaced", to: null, setsAfter: null })],
      ["strength-a.5"],
      [{ before: { at: place(1), sets: 16 }, after: null, unplaced: true }],
    ],
    [
      "lost its place, and is no longer wanted",
      [lift({ kind: "unplaced", to: null, setsAfter: null })],
      [],
      [{ before: { at: place(1), sets: 16 }, after: null, unplaced: false }],
    ],
    [
      "new, and finds no place",
      [lift({ kind: "unplaced", from: null, to: null, setsBefore: null, setsAfter: null })],
      ["strength-a.5"],
      [{ before: null, after: null, unplaced: true }],
    ],
    [
      "new, found no place and is no longer wanted: nothing",
      [lift({ kind: "unplaced", from: null, to: null, setsBefore: null, setsAfter: null })],
      [],
      [],
    ],
    [
      "only its sets",
      [lift({ kind: "dose", to: place(1), setsAfter: 12 })],
      [],
      [{ before: { at: place(1), sets: 16 }, after: { at: place(1), sets: 12 }, unplaced: false }],
    ],
  ])("%s", (_name, effects, unplaced, expected) => {
    const net = netLifts(burstOf(effects.map((effect) => ({ lifts: [effect] }))), new Set(unplaced));
    expect(net.map(({ before, after, unplaced: lost }) => ({ before, after, unplaced: lost }))).toEqual(
      expected,
    );
  });

  it("gives the reason of the last move: earlier ones may no longer hold", () => {
    const because = (text: string) => [{ rule: "r", text }];
    const net = netLifts(
      burstOf([
        { lifts: [lift({ because: because("old") })] },
        { lifts: [lift({ from: place(2), to: place(3), because: because("new") })] },
      ]),
      nowhere,
    );
    expect(net[0]?.because).toEqual(because("new"));
  });

  it("leaves out what only revisions touched that the reader is not told of", () => {
    expect(
      netLifts(
        burstOf([{ lifts: [lift({})] }, { lifts: [lift({ id: "strength-b.5" })], told: false }]),
        nowhere,
      ).map(({ id }) => id),
    ).toEqual(["strength-a.5"]);
  });
});

describe("the net effect on a sport session", () => {
  it("an edited title that was edited back is nothing; one that stayed is told", () => {
    const edited = sport({ kind: "edited", to: { ...place(1), minutes: 60 } });
    const twice = burstOf([{ sport: [edited] }, { sport: [edited] }]);
    const was = new Map([["sat", session({})]]);
    expect(netSport(twice, was, new Map([["sat", session({})]]))).toEqual([]);
    expect(netSport(twice, was, new Map([["sat", session({ title: "Drills" })]]))).toHaveLength(1);
  });

  it("moved and moved back is nothing, a new length is told", () => {
    const back = sport({ from: { ...place(2), minutes: 60 }, to: { ...place(1), minutes: 60 } });
    const longer = sport({ from: { ...place(2), minutes: 60 }, to: { ...place(1), minutes: 90 } });
    const same = new Map([["sat", session({})]]);
    expect(netSport(burstOf([{ sport: [sport({})] }, { sport: [back] }]), same, same)).toEqual([]);
    expect(netSport(burstOf([{ sport: [sport({})] }, { sport: [longer] }]), none, none)).toMatchObject([
      { before: { minutes: 60 }, after: { minutes: 90 } },
    ]);
  });
});
