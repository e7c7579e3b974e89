import type { LogWithSets } from "@/db/queries/logs";
import type { LogView } from "@/lib/schemas/today";

/** A log as its athlete and coaches see it. */
export const logView = ({ log, sets }: LogWithSets): LogView => ({
  state: log.state,
  effort: log.effort,
  minutes: log.minutes,
  hardRounds: log.hardRounds,
  knock: log.knock,
  painPlace: log.painPlace,
  pain: log.pain,
  note: log.note,
  sets: sets.map(({ slot, number, exerciseId, kg, reps, reserve }) => ({
    slot,
    number,
    exerciseId,
    kg,
    reps,
    reserve,
  })),
  version: log.version,
  loggedAt: log.loggedAt.toISOString(),
  changedAt: log.changedAt.toISOString(),
});
