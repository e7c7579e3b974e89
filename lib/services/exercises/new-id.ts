/** No id of the library begins so: a later library never meets a team's own exercise. */
const OWN = "own-";
const LONGEST = 60;

/** "own-quay-turn" of "Quay turn", with a number behind where `taken` has it. */
export function newExerciseId(name: string, taken: ReadonlySet<string>): string {
  const plain = name
    .normalize("NFKD")
    .replace(/\p{M}/gu, "")
    .toLowerCase()
    .replace(/[^a-z0-9]+/g, "-")
    .slice(0, LONGEST)
    .replace(/^-+|-+$/g, "");
  const base = `${OWN}${plain || "exercise"}`;
  for (let id = base, number = 2; ; id = `${base}-${number++}`) if (!taken.has(id)) return id;
}
