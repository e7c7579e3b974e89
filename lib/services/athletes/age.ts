/** Years of age under which weight descent is switched off. */
const OF_AGE = 18;

/** True for someone born less than 18 years before `today` (both YYYY-MM-DD); of someone without a date it is not known. */
export function isMinor(dateOfBirth: string | null, today: string): boolean {
  if (dateOfBirth === null) return false;
  const birthday = `${String(Number(dateOfBirth.slice(0, 4)) + OF_AGE).padStart(4, "0")}${dateOfBirth.slice(4)}`;
  return today < birthday;
}
