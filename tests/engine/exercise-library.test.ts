import { describe, expect, it } from "vitest";
import { EXERCISES } from "@/db/seed/exercises";
import {
  AIMS,
  EQUIPMENT,
  LIMITATIONS,
  QUALITIES,
  type Aim,
  type Equipment,
  type Exercise,
  type Limitation,
  type Quality,
} from "@/lib/engine/prescription/exercise";

const byId = new Map(EXERCISES.map((exercise) => [exercise.id, exercise]));
const of = (quality: Quality): readonly Exercise[] =>
  EXERCISES.filter(({ qualities }) => qualities[0] === quality);
const ids = (exercises: readonly Exercise[]): readonly string[] => exercises.map(({ id }) => id);
const breaking = (breaks: (exercise: Exercise) => boolean): readonly string[] =>
  ids(EXERCISES.filter(breaks));
const needsOnly = (exercise: Exercise, ...there: readonly Equipment[]): boolean =>
  exercise.equipment.every((thing) => there.includes(thing));
const has = (aim: Aim) => (exercise: Exercise) => exercise.doses[aim] !== undefined;

/** What sessions ask of each quality. */
const ASKED: Readonly<Record<Quality, readonly Aim[]>> = {
  rotation: ["volume", "fast"],
  "anti-rotation": ["volume", "hold"],
  "trunk-flexion": ["volume", "hold"],
  "lateral-trunk": ["volume", "hold"],
  "lateral-push": ["heavy", "volume", "fast", "hold"],
  "hip-flexion": ["volume", "fast", "hold"],
  "posterior-chain": ["heavy", "volume", "fast", "hold"],
  "knee-dominant": ["heavy", "volume", "fast", "hold"],
  press: ["heavy", "volume", "fast"],
  pull: ["heavy", "volume", "fast"],
  neck: ["volume", "hold"],
  grip: ["volume", "hold"],
  jump: ["fast"],
  throw: ["fast"],
  "calf-and-foot": ["heavy", "volume", "fast", "hold"],
  mobility: ["volume", "hold"],
};

/** Qualities that a limitation rules out as a whole, and why. */
const RULED_OUT_WHOLE: readonly { quality: Quality; limitation: Limitation; why: string }[] = [
  {
    quality: "neck",
    limitation: "neck",
    why: "A sore neck is not loaded; there is nothing beside it to train.",
  },
];

/** Main qualities whose exercises are never done near a best: small muscles, the spine turning or bending, or speed. */
const NEVER_HEAVY: readonly Quality[] = [
  "rotation",
  "anti-rotation",
  "trunk-flexion",
  "lateral-trunk",
  "hip-flexion",
  "neck",
  "grip",
  "jump",
  "throw",
  "mobility",
];

/** Lowest and highest count of repetitions (seconds for holds) that an aim means at all. Common practice, no published source. */
const SANE: Readonly<Record<Aim, readonly [number, number]>> = {
  heavy: [1, 8],
  volume: [3, 20],
  fast: [1, 15],
  hold: [8, 60],
};

describe("the exercise library", () => {
  it("holds at least 125 exercises, each with its own kebab-case id and its own name", () => {
    expect(EXERCISES.length).toBeGreaterThanOrEqual(125);
    expect(byId.size).toBe(EXERCISES.length);
    expect(new Set(EXERCISES.map(({ name }) => name.toLowerCase())).size).toBe(EXERCISES.length);
    expect(breaking(({ id }) => !/^[a-z]+(-[a-z]+)*$/.test(id))).toEqual([]);
  });

  it("names qualities, equipment and limitations of the closed lists, each once", () => {
    const once = (list: readonly string[], closed: readonly string[]): boolean =>
      new Set(list).size === list.length && list.every((one) => closed.includes(one));
    expect(
      breaking(
        ({ qualities, equipment, ruledOutBy }) =>
          !once(qualities, QUALITIES) || !once(equipment, EQUIPMENT) || !once(ruledOutBy, LIMITATIONS),
      ),
    ).toEqual([]);
  });

  it("uses every thing and every limitation of the closed lists", () => {
    for (const thing of EQUIPMENT) {
      expect(
        breaking(({ equipment }) => equipment.includes(thing)),
        thing,
      ).not.toEqual([]);
    }
    for (const limitation of LIMITATIONS) {
      expect(
        breaking(({ ruledOutBy }) => ruledOutBy.includes(limitation)),
        limitation,
      ).not.toEqual([]);
    }
  });

  it("gives two to four cues of at most 90 characters, none said twice within an exercise", () => {
    expect(breaking(({ cues }) => cues.length < 2 || cues.length > 4)).toEqual([]);
    expect(
      breaking(({ cues }) => cues.some((cue) => cue.length > 90 || cue.trim() !== cue || cue === "")),
    ).toEqual([]);
    expect(breaking(({ cues }) => new Set(cues).size < cues.length)).toEqual([]);
  });

  it("gives every exercise a dose, with ranges the right way round and within what the aim means", () => {
    expect(breaking(({ doses }) => Object.keys(doses).length === 0)).toEqual([]);
    for (const aim of AIMS) {
      const [low, high] = SANE[aim];
      expect(
        breaking(({ doses }) => {
          const dose = doses[aim];
          if (!dose) return false;
          const { sets, reps } = dose;
          const whole = [sets.low, sets.high, reps.low, reps.high].every(Number.isInteger);
          const inOrder = 1 <= sets.low && sets.low <= sets.high && sets.high <= 6 && reps.low <= reps.high;
          return !whole || !inOrder || reps.low < low || reps.high > high;
        }),
        aim,
      ).toEqual([]);
    }
  });

  it("never asks more repetitions of a heavy set than of a volume set, and rests longer for it", () => {
    expect(
      breaking(
        ({ doses: { heavy, volume } }) =>
          heavy !== undefined &&
          (volume === undefined || heavy.reps.high > volume.reps.high || heavy.reps.low > volume.reps.low),
      ),
    ).toEqual([]);
    expect(breaking(({ doses, rest }) => doses.heavy !== undefined && rest < 90)).toEqual([]);
    expect(breaking(({ rest }) => !Number.isInteger(rest) || rest < 15 || rest > 240)).toEqual([]);
  });

  it("does nothing near a best whose main quality is the turning or bending spine, small muscles or speed", () => {
    expect(
      breaking((exercise) => NEVER_HEAVY.includes(exercise.qualities[0]) && has("heavy")(exercise)),
    ).toEqual([]);
  });

  it("does explosive exercises fast and never heavy, and held ones for seconds only", () => {
    const explosive = ({ intent }: Exercise): boolean => intent === "explosive";
    const held = ({ intent }: Exercise): boolean => intent === "held";
    expect(breaking((one) => explosive(one) && (!has("fast")(one) || has("heavy")(one)))).toEqual([]);
    expect(breaking((one) => held(one) !== has("hold")(one))).toEqual([]);
    expect(breaking((one) => held(one) && Object.keys(one.doses).length > 1)).toEqual([]);
  });

  it("does controlled lifts fast only where a published zone says at which load", () => {
    expect(
      breaking((one) => one.intent === "controlled" && has("fast")(one) && one.powerZone === undefined),
    ).toEqual([]);
  });

  it("says percent of best only for lifts whose best can be taken, and speed of those only within a zone", () => {
    const { best, other } = {
      best: EXERCISES.filter(({ load }) => load === "best"),
      other: EXERCISES.filter(({ load }) => load !== "best"),
    };
    expect(
      ids(other.filter(({ bestOf, powerZone }) => bestOf !== undefined || powerZone !== undefined)),
    ).toEqual([]);
    expect(ids(best.filter((one) => has("fast")(one) && one.powerZone === undefined))).toEqual([]);
    expect(
      ids(best.filter(({ bestOf }) => bestOf !== undefined && byId.get(bestOf)?.load !== "best")),
    ).toEqual([]);
  });

  // Soriano et al. 2015, Sports Med 45:1191-1205: squat above 30 and below 70 %, jump squat up to 30 %, power clean and hang power
  // clean from 70 % (90 as the upper end: Cormie, McGuigan & Newton 2011, Sports Med 41:125-146, from memory).
  it("loads ballistic lifts within the published zones of most power", () => {
    const zones = EXERCISES.flatMap(({ id, bestOf, powerZone }) =>
      powerZone ? [`${id} ${powerZone.low}-${powerZone.high} of ${bestOf ?? id}`] : [],
    );
    expect(zones.toSorted()).toEqual([
      "back-squat 31-69 of back-squat",
      "barbell-jump-squat 0-30 of back-squat",
      "front-squat 31-69 of front-squat",
      "hang-power-clean 70-90 of hang-power-clean",
      "power-clean 70-90 of power-clean",
      "trap-bar-jump 0-30 of trap-bar-deadlift",
    ]);
  });

  it("leads from easier to harder and back along one line, within one main quality", () => {
    const wrong = EXERCISES.flatMap((exercise) =>
      [
        { other: exercise.easier, back: "harder" as const },
        { other: exercise.harder, back: "easier" as const },
      ].flatMap(({ other, back }) => {
        if (other === null) return [];
        const found = byId.get(other);
        const fits = found?.[back] === exercise.id && found.qualities[0] === exercise.qualities[0];
        return fits ? [] : [`${exercise.id} and ${other}`];
      }),
    );
    expect(wrong).toEqual([]);
  });

  it("never comes back to an exercise by going to harder ones", () => {
    for (const { id } of EXERCISES) {
      const seen = new Set<string>();
      for (let next: string | null = id; next !== null; next = byId.get(next)?.harder ?? null) {
        expect(seen.has(next), `${id} leads back to ${next}`).toBe(false);
        seen.add(next);
      }
    }
  });
});

describe("choices of the exercise library", () => {
  it.each(QUALITIES)("has at least five exercises whose main quality is %s", (quality) => {
    expect(of(quality).length).toBeGreaterThanOrEqual(5);
  });

  it.each(QUALITIES.flatMap((quality) => ASKED[quality].map((aim) => ({ quality, aim }))))(
    "$quality, $aim: without equipment or with a band and dumbbells alone",
    ({ quality, aim }) => {
      expect(
        ids(of(quality).filter((one) => has(aim)(one) && needsOnly(one, "band", "dumbbell"))),
      ).not.toEqual([]);
    },
  );

  it.each(QUALITIES)("%s: something with the floor alone", (quality) => {
    expect(ids(of(quality).filter((one) => needsOnly(one)))).not.toEqual([]);
  });

  it.each(LIMITATIONS)("an athlete with a sore %s still has a choice of every quality", (limitation) => {
    const without = QUALITIES.filter((quality) =>
      of(quality).every(({ ruledOutBy }) => ruledOutBy.includes(limitation)),
    );
    expect(without).toEqual(
      RULED_OUT_WHOLE.filter((row) => row.limitation === limitation).map(({ quality }) => quality),
    );
  });

  it("has main lifts that are big: legs, press or pull, heavy and for volume, moved under control", () => {
    const big: readonly Quality[] = ["knee-dominant", "posterior-chain", "lateral-push", "press", "pull"];
    const mains = EXERCISES.filter(({ main }) => main);
    expect(
      ids(
        mains.filter(
          (one) =>
            !big.includes(one.qualities[0]) ||
            one.intent !== "controlled" ||
            !has("heavy")(one) ||
            !has("volume")(one),
        ),
      ),
    ).toEqual([]);
  });

  const MAINS: Readonly<Record<string, readonly Quality[]>> = {
    legs: ["knee-dominant", "posterior-chain"],
    press: ["press"],
    pull: ["pull"],
    "press or pull": ["press", "pull"],
  };
  const mainsOf = (name: string): readonly Exercise[] =>
    EXERCISES.filter(({ main, qualities }) => main && (MAINS[name] ?? []).includes(qualities[0]));

  it.each([
    { name: "floor alone", there: [] },
    { name: "a band and dumbbells", there: ["band", "dumbbell"] },
    { name: "kettlebells", there: ["kettlebell"] },
    { name: "a barbell in a rack, plates and a bench", there: ["barbell", "rack", "plate", "bench"] },
  ] as const)("main lifts for legs, press and pull with $name", ({ there }) => {
    for (const name of Object.keys(MAINS)) {
      expect(ids(mainsOf(name).filter((one) => needsOnly(one, ...there))), name).not.toEqual([]);
    }
  });

  it.each(LIMITATIONS)("main lifts for legs and for the upper body remain with a sore %s", (limitation) => {
    for (const name of ["legs", "press or pull"]) {
      expect(
        ids(mainsOf(name).filter(({ ruledOutBy }) => !ruledOutBy.includes(limitation))),
        name,
      ).not.toEqual([]);
    }
  });

  it("has at least 14 mobility exercises, of all three kinds, and no stretch elsewhere", () => {
    const mobility = of("mobility");
    expect(mobility.length).toBeGreaterThanOrEqual(14);
    for (const kind of ["active", "passive", "against-antagonist"] as const) {
      expect(mobility.filter(({ stretch }) => stretch === kind).length, kind).toBeGreaterThanOrEqual(5);
    }
    expect(
      breaking(({ qualities, stretch }) => (qualities[0] === "mobility") !== (stretch !== undefined)),
    ).toEqual([]);
    expect(ids(mobility.filter(({ load }) => load !== "none"))).toEqual([]);
    expect(ids(mobility.filter(({ qualities }) => qualities.length < 2))).toEqual([]);
  });

  it.each(QUALITIES.filter((quality) => quality !== "mobility"))(
    "has mobility that prepares for %s",
    (quality) => {
      expect(ids(of("mobility").filter(({ qualities }) => qualities.includes(quality)))).not.toEqual([]);
    },
  );
});
