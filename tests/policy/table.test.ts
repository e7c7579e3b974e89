import { expect, it } from "vitest";
import { POLICY, ROLES, can, type Action, type Role } from "@/lib/policy";

/**
 * Who may do what, written out by hand from the table of people in the product's description, in the order of `ROLES`:
 * head, strength, skills, medic, athlete, guest. `x` everywhere in the team, `o` for the own athlete, `.` never.
 */
const EXPECTED: Record<Action, string> = {
  // "everything in the team but medical notes; sees holds, not their reasons"
  "team.manage": "x.....",
  "team.people": "xxxx..",
  "athletes.read": "xxxxo.",
  "athletes.write": "xx....",
  "board.read": "xxxx..",
  "camps.create": "xx....",
  "camps.read": "xxxxoo",
  "camps.history": "xxxx..",
  "camps.bout": "x.....",
  // Skills coach: "sport sessions and their intensity; sees lifting on the calendar; no weights, check-ins or medical"
  "sport.write": "xxx...",
  "lifts.write": "xx....",
  "lifts.detail": "xxxxo.",
  "camps.put-back": "xx....",
  "weight.read": "xx..o.",
  // Medic: "holds and documents; sees check-ins; never edits the plan"
  "checkins.read": "xx.xo.",
  "holds.read": "xxxxo.",
  "holds.reason": "...xo.",
  "holds.write": "...x..",
  "timetable.read": "xxxx..",
  "timetable.write": "x.x...",
  "exercises.read": "xxxx..",
  "exercises.write": "xx....",
  "prescription.write": "xx....",
  "prescription.swap": "xx..o.",
  "bests.write": "xx..o.",
  "logs.read": "xx..o.",
  "logs.write": "xx..o.",
  "pain.read": "xx.xo.",
  // Athlete: "own data only; logs, check-ins, weights, own feed; may ask for a change"
  "checkins.write": "....o.",
  "weight.write": "xx..o.",
  "requests.ask": "....o.",
  "requests.answer": "xx....",
  "tests.read": "xx..o.",
  "tests.write": "xx....",
  "suggestions.decide": "xx....",
  "result.write": "x.....",
  "report.read": "xxxxo.",
  "rules.read": "xx....",
  "rules.write": "xx....",
  // Guest: "read-only calendar of one athlete, no health data"
  "feeds.own": "....oo",
  "feeds.team": "xxxx..",
  "account.own": "xxxxxx",
};

const OWN = "a-1";
const OTHER = "a-2";
const memberOf = (role: Role) => ({ role, athleteId: role === "athlete" || role === "guest" ? OWN : null });

const marked = (action: Action, role: Role): string => {
  const member = memberOf(role);
  if (can(member, action) && can(member, action, OTHER)) return "x";
  return can(member, action, OWN) ? "o" : ".";
};

it.each(Object.keys(POLICY) as Action[])(
  "%s is allowed to exactly the roles of the product's table",
  (action) => {
    expect(ROLES.map((role) => marked(action, role)).join("")).toBe(EXPECTED[action]);
  },
);

it("every action has its row here, and no other", () => {
  expect(Object.keys(EXPECTED).sort()).toEqual(Object.keys(POLICY).sort());
});

it.each(Object.keys(POLICY) as Action[])(
  "%s: what is one's own never reaches another athlete's",
  (action) => {
    for (const role of ["athlete", "guest"] as const) {
      expect(can(memberOf(role), action, OTHER)).toBe(EXPECTED[action][ROLES.indexOf(role)] === "x");
    }
  },
);

it("a membership without an athlete owns nothing", () => {
  for (const action of Object.keys(POLICY) as Action[]) {
    const unbound = { role: "athlete", athleteId: null } as const;
    expect(can(unbound, action, OWN)).toBe(EXPECTED[action][ROLES.indexOf("athlete")] === "x");
  }
});

it("nobody but the medic sets or lifts a hold, and the medic edits no plan", () => {
  const plan: Action[] = [
    "camps.create",
    "camps.bout",
    "sport.write",
    "lifts.write",
    "camps.put-back",
    "rules.write",
  ];
  expect(plan.filter((action) => can(memberOf("medic"), action))).toEqual([]);
  expect(ROLES.filter((role) => can(memberOf(role), "holds.write"))).toEqual(["medic"]);
});
