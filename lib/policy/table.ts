import type { Role } from "./roles";

/** `own`: only for the athlete that the membership names (an athlete's own data, or the one a guest follows). */
interface PolicyRow {
  readonly description: string;
  readonly roles: readonly Role[];
  readonly own?: readonly Role[];
}

/** The one table that says who may do what: server, pages and README read it. Deny by default. */
export const POLICY = {
  "team.manage": { description: "Invite, change and remove people; name the team", roles: ["head"] },
  "team.people": { description: "See who is in the team", roles: ["head", "strength", "skills", "medic"] },
  "athletes.read": {
    description: "See an athlete's profile",
    roles: ["head", "strength", "skills", "medic"],
    own: ["athlete"],
  },
  "athletes.write": { description: "Add and edit athletes", roles: ["head", "strength"] },
  "board.read": { description: "See the board", roles: ["head", "strength", "skills", "medic"] },
  "camps.create": { description: "Set a bout and lay out a camp", roles: ["head", "strength"] },
  "camps.read": {
    description: "See a camp's calendar",
    roles: ["head", "strength", "skills", "medic"],
    own: ["athlete", "guest"],
  },
  "camps.history": { description: "See a camp's changes", roles: ["head", "strength", "skills", "medic"] },
  "camps.bout": { description: "Change the bout or mark it off", roles: ["head"] },
  "sport.write": {
    description: "Add, move, edit and drop sport sessions",
    roles: ["head", "strength", "skills"],
  },
  "lifts.write": {
    description: "Pin and release lifting, set the coach's factor",
    roles: ["head", "strength"],
  },
  "lifts.detail": {
    description: "See sets, factors and reasons of lifting",
    roles: ["head", "strength", "skills", "medic"],
    own: ["athlete"],
  },
  "camps.put-back": { description: "Put back a saved change", roles: ["head", "strength"] },
  "weight.read": {
    description: "See weights and the weight limit path",
    roles: ["head", "strength"],
    own: ["athlete"],
  },
  "checkins.read": { description: "See check-ins", roles: ["head", "strength", "medic"], own: ["athlete"] },
  "holds.read": {
    description: "See that an athlete is on a hold",
    roles: ["head", "strength", "skills", "medic"],
    own: ["athlete"],
  },
  "holds.reason": {
    description: "See the reason of a hold (medical note)",
    roles: ["medic"],
    own: ["athlete"],
  },
  "holds.write": { description: "Set and lift holds", roles: ["medic"] },
  "timetable.read": { description: "See the gym's week", roles: ["head", "strength", "skills", "medic"] },
  "timetable.write": { description: "Edit the gym's week", roles: ["head", "skills"] },
  "exercises.read": { description: "See the exercises", roles: ["head", "strength", "skills", "medic"] },
  "exercises.write": { description: "Add and edit the team's exercises", roles: ["head", "strength"] },
  "prescription.write": {
    description: "Edit sets, loads and exercises of a session",
    roles: ["head", "strength"],
  },
  "prescription.swap": {
    description: "Swap an exercise for one of the same quality",
    roles: ["head", "strength"],
    own: ["athlete"],
  },
  "bests.write": { description: "Add bests", roles: ["head", "strength"], own: ["athlete"] },
  "logs.read": { description: "See what was logged", roles: ["head", "strength"], own: ["athlete"] },
  "logs.write": { description: "Log sessions", roles: ["head", "strength"], own: ["athlete"] },
  "pain.read": {
    description: "See pain and knocks that the athlete reported",
    roles: ["head", "strength", "medic"],
    own: ["athlete"],
  },
  "checkins.write": { description: "Check in", roles: [], own: ["athlete"] },
  "weight.write": { description: "Add weights", roles: ["head", "strength"], own: ["athlete"] },
  "requests.ask": { description: "Say that a session cannot be made", roles: [], own: ["athlete"] },
  "requests.answer": { description: "Answer such a request", roles: ["head", "strength"] },
  "tests.read": { description: "See tests and bests", roles: ["head", "strength"], own: ["athlete"] },
  "tests.write": { description: "Add and upload tests", roles: ["head", "strength"] },
  "suggestions.decide": { description: "See, accept and dismiss suggestions", roles: ["head", "strength"] },
  "result.write": { description: "Record how the bout ended", roles: ["head"] },
  "report.read": {
    description: "See the report after the bout",
    roles: ["head", "strength", "skills", "medic"],
    own: ["athlete"],
  },
  "rules.read": { description: "See the house rules", roles: ["head", "strength"] },
  "rules.write": { description: "Change the house rules", roles: ["head", "strength"] },
  "feeds.own": {
    description: "Subscribe to the calendar of one's own athlete",
    roles: [],
    own: ["athlete", "guest"],
  },
  "feeds.team": {
    description: "Subscribe to one athlete's or the whole team's calendar",
    roles: ["head", "strength", "skills", "medic"],
  },
  "account.own": {
    description: "Change one's own account, units and mail choices",
    roles: ["head", "strength", "skills", "medic", "athlete", "guest"],
  },
} as const satisfies Record<string, PolicyRow>;

export type Action = keyof typeof POLICY;

/** Who asks: role in the team and, for athletes and guests, the athlete the membership is tied to. */
export interface Member {
  readonly role: Role;
  readonly athleteId: string | null;
}

/**
 * True where the table allows it. `athleteId` names the athlete the subject belongs to; leave it out for team-wide
 * subjects. Never true for an action that the table does not give to the role.
 */
export function can(member: Member, action: Action, athleteId?: string): boolean {
  const row: PolicyRow = POLICY[action];
  if (row.roles.includes(member.role)) return true;
  return (
    (row.own?.includes(member.role) ?? false) &&
    member.athleteId !== null &&
    athleteId !== undefined &&
    member.athleteId === athleteId
  );
}
