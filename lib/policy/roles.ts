export const ROLES = ["head", "strength", "skills", "medic", "athlete", "guest"] as const;
export type Role = (typeof ROLES)[number];

export const ROLE_TITLES: Record<Role, string> = {
  head: "Head coach",
  strength: "S&C coach",
  skills: "Skills coach",
  medic: "Medic",
  athlete: "Athlete",
  guest: "Guest",
};

/** Roles that look after more than one athlete. */
export const STAFF: readonly Role[] = ["head", "strength", "skills", "medic"];

export const isStaff = (role: Role): boolean => STAFF.includes(role);
