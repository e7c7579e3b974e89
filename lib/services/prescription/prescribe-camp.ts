import { findAthlete, type AthleteRow } from "@/db/queries/athletes";
import { listExercises } from "@/db/queries/exercises";
import { listBests, listOverrides, type BestRow } from "@/db/queries/prescription";
import { liftsOf } from "@/db/mappers/sessions";
import type { Tx } from "@/db/client";
import { dayFromIso, prescribe } from "@/lib/engine";
import type { BaseMix, Best, Exercise, LiftEdit, PrescribedLift, Swap } from "@/lib/engine";
import type { Kg, StrikingBase } from "@/lib/engine/types";
import { STRIKING_BASES } from "@/lib/engine/types";
import type { LoadedCamp } from "@/lib/services/camps/load";
import type { TeamContext } from "@/lib/services/context";

/** A camp with its lifts; a loaded camp is one. */
export type CampWithLifts = Pick<LoadedCamp, "row"> & {
  readonly sessions: readonly Pick<LoadedCamp["sessions"][number], "lift" | "startsAt" | "status">[];
};

/** What prescriptions of one athlete's camps are made from. */
export interface PrescriptionParts {
  readonly athlete: AthleteRow;
  readonly exercises: readonly Exercise[];
  readonly bests: readonly Best[];
  readonly overrides: ReadonlyMap<
    string,
    { readonly swaps: readonly Swap[]; readonly edits: Readonly<Record<string, LiftEdit>> }
  >;
}

const bestOf = ({ exerciseId, day, kg, formula }: BestRow): Best => ({
  exercise: exerciseId,
  day: dayFromIso(day),
  kg: kg as Kg,
  from: formula ?? "measured",
});

/** Newest added last wins its day. */
const bestsOf = (rows: readonly BestRow[]): Best[] => [
  ...new Map(rows.map((row) => [`${row.exerciseId} ${row.day}`, bestOf(row)])).values(),
];

const baseNamed = (text: string): StrikingBase | undefined => STRIKING_BASES.find((base) => base === text);

/** The camp's own striking base with the athlete's second one beside it. */
function mixOf(campBase: string, { strikingBase, secondBase, secondShare }: AthleteRow): BaseMix {
  const first = baseNamed(campBase) ?? strikingBase;
  if (secondBase === null || secondShare === null || secondBase === first) return [{ base: first, share: 1 }];
  return [
    { base: first, share: 1 - secondShare },
    { base: secondBase, share: secondShare },
  ];
}

/** Three questions for any number of camps of one athlete. */
export async function loadPrescriptionParts(
  tx: Tx,
  teamId: string,
  athlete: AthleteRow,
  campIds: readonly string[],
): Promise<PrescriptionParts> {
  const [exercises, bests, overrides] = await Promise.all([
    listExercises(tx, teamId),
    listBests(tx, teamId, athlete.id),
    listOverrides(tx, teamId, campIds),
  ]);
  return {
    athlete,
    exercises: exercises.flatMap(({ exercise, shelved }) => (shelved ? [] : [exercise])),
    bests: bestsOf(bests),
    overrides: new Map(overrides.map(({ campId, swaps, edits }) => [campId, { swaps, edits }])),
  };
}

/** Prescriptions of a camp's lifts, in their order, from parts that are loaded. */
export function prescribeFrom(
  { athlete, exercises, bests, overrides }: PrescriptionParts,
  { row, sessions }: CampWithLifts,
  now: Date,
): readonly PrescribedLift[] {
  const own = overrides.get(row.id);
  return prescribe({
    lifts: liftsOf(sessions, now),
    exercises,
    mix: mixOf(row.strikingBase, athlete),
    equipment: athlete.equipment,
    limitations: athlete.limitationCodes,
    bests,
    plates: { unit: athlete.plateUnit, step: athlete.plateStep },
    swaps: own?.swaps ?? [],
    edits: own?.edits ?? {},
  });
}

/** What is in each lifting session of a camp, in the order of its lifts. */
export async function prescribeCamp(
  tx: Tx,
  ctx: Pick<TeamContext, "teamId" | "now">,
  camp: CampWithLifts,
): Promise<readonly PrescribedLift[]> {
  const athlete = await findAthlete(tx, ctx.teamId, camp.row.athleteId);
  if (!athlete) throw new Error("A camp without an athlete cannot be.");
  const parts = await loadPrescriptionParts(tx, ctx.teamId, athlete, [camp.row.id]);
  return prescribeFrom(parts, camp, ctx.now);
}
