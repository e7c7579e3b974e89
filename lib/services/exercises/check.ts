import type { Exercise } from "@/lib/engine/prescription/exercise";
import { AppError, type FieldError } from "@/lib/errors";

const plain = (name: string): string => name.trim().toLowerCase();

/** What is wrong with an exercise beside the team's others (itself among them, where it is not new). */
function problems(exercise: Exercise, all: readonly Exercise[]): FieldError[] {
  const others = all.filter(({ id }) => id !== exercise.id);
  const found: FieldError[] = [];
  if (others.some(({ name }) => plain(name) === plain(exercise.name)))
    found.push({ pointer: "/name", message: "There is an exercise of this name already." });
  for (const field of ["easier", "harder"] as const) {
    const id = exercise[field];
    if (id === null) continue;
    const other = others.find((candidate) => candidate.id === id);
    if (!other) found.push({ pointer: `/${field}`, message: "Pick another exercise of the list." });
    else if (!other.qualities.some((quality) => exercise.qualities.includes(quality)))
      found.push({ pointer: `/${field}`, message: "It must train one of the same qualities." });
  }
  const { bestOf } = exercise;
  if (bestOf !== undefined && !others.some(({ id, load }) => id === bestOf && load === "best"))
    found.push({ pointer: "/bestOf", message: "Pick an exercise that is loaded by its best." });
  return found;
}

/** Throws `invalid` with what is wrong, each beside its field. */
export function checkExercise(exercise: Exercise, all: readonly Exercise[]): void {
  const errors = problems(exercise, all);
  if (errors.length > 0) throw new AppError("invalid", "Some fields need another look.", { errors });
}
