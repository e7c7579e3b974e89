import { randomUUID } from "node:crypto";
import type { Action } from "@/lib/policy";
import { campForm } from "../factories/camp-book";
import { ACCOUNT, BEST, CHANGE, EXERCISE_FORM, LOG, PROFILE, SESSION, TRIAL } from "./bodies";
import type { Call } from "./client";

/** What a row may name of the team that a test made, or of a foreign one. */
export interface Scene {
  readonly athleteId: string;
  readonly campId: string;
  readonly holdId: string;
  readonly inviteId: string;
  readonly membershipId: string;
  readonly entryId: string;
  readonly feedId: string;
  readonly exerciseId: string;
  /** A request of the athlete that waits for an answer. */
  readonly requestId: string;
  /** A session of the camp that can be logged. */
  readonly sessionId: string;
  /** A lifting session that is still to come. */
  readonly liftId: string;
  readonly bestId: string;
  /** A trial of a test, and the upload that brought it. */
  readonly trialId: string;
  readonly uploadId: string;
}

export interface RouteRow {
  readonly path: string;
  readonly method: "GET" | "POST" | "PUT" | "PATCH" | "DELETE";
  /** What the table must allow; null where the service decides by what is asked. */
  readonly may: Action | null;
  /** A good body; undefined where there is none. */
  readonly body?: (scene: Scene) => unknown;
  /** Parameters of the path, of things that belong to `scene`. */
  readonly params?: (scene: Scene) => Record<string, string>;
}

/** Every route for members of a team. */
export const TEAM_ROUTES: readonly RouteRow[] = [
  { path: "board", method: "GET", may: "board.read" },
  {
    path: "camps/[id]/suggestions",
    method: "GET",
    may: "suggestions.decide",
    params: ({ campId }) => ({ id: campId }),
  },
  {
    path: "camps/[id]/suggestions/[key]/accept",
    method: "POST",
    may: "suggestions.decide",
    params: ({ campId }) => ({ id: campId, key: "pain:mon@2026-11-30" }),
    body: () => ({ baseRevision: 1, idempotencyKey: "5d1f0a52-6f0e-4b57-9a55-0c7f3a1f7b9a", note: "" }),
  },
  {
    path: "camps/[id]/suggestions/[key]/dismiss",
    method: "POST",
    may: "suggestions.decide",
    params: ({ campId }) => ({ id: campId, key: "pain:mon@2026-11-30" }),
    body: () => ({ reason: "Talked about it." }),
  },
  { path: "account", method: "GET", may: "account.own" },
  { path: "account", method: "PUT", may: "account.own", body: () => ACCOUNT },
  {
    path: "account/password",
    method: "POST",
    may: "account.own",
    body: () => ({ current: "wrong", password: "a-new-password" }),
  },
  { path: "account/team", method: "POST", may: "account.own", body: () => ({ teamId: randomUUID() }) },
  { path: "team", method: "GET", may: "account.own" },
  {
    path: "team",
    method: "PUT",
    may: "team.manage",
    body: () => ({ name: "North Pier Gym", timeZone: "Europe/Zagreb" }),
  },
  { path: "people", method: "GET", may: "team.people" },
  {
    path: "people/[id]",
    method: "PATCH",
    may: "team.manage",
    body: () => ({ role: "strength", athleteId: null }),
    params: ({ membershipId }) => ({ id: membershipId }),
  },
  {
    path: "people/[id]",
    method: "DELETE",
    may: "team.manage",
    params: ({ membershipId }) => ({ id: membershipId }),
  },
  {
    path: "invites",
    method: "POST",
    may: "team.manage",
    body: () => ({ email: `${randomUUID()}@new.example`, role: "skills", athleteId: null }),
  },
  {
    path: "invites/[id]",
    method: "DELETE",
    may: "team.manage",
    params: ({ inviteId }) => ({ id: inviteId }),
  },
  { path: "athletes", method: "GET", may: "athletes.read" },
  { path: "athletes", method: "POST", may: "athletes.write", body: () => PROFILE },
  {
    path: "athletes/[id]",
    method: "GET",
    may: "athletes.read",
    params: ({ athleteId }) => ({ id: athleteId }),
  },
  {
    path: "athletes/[id]",
    method: "PUT",
    may: "athletes.write",
    body: () => PROFILE,
    params: ({ athleteId }) => ({ id: athleteId }),
  },
  {
    path: "athletes/[id]/holds",
    method: "POST",
    may: "holds.write",
    body: () => ({ from: "2026-12-05", to: null, reason: "Knock to the head on Friday." }),
    params: ({ athleteId }) => ({ id: athleteId }),
  },
  {
    path: "holds/[id]/lift",
    method: "POST",
    may: "holds.write",
    params: ({ holdId }) => ({ id: holdId }),
  },
  {
    path: "athletes/[id]/tests",
    method: "GET",
    may: "tests.read",
    params: ({ athleteId }) => ({ id: athleteId }),
  },
  {
    path: "athletes/[id]/tests",
    method: "POST",
    may: "tests.write",
    body: () => TRIAL,
    params: ({ athleteId }) => ({ id: athleteId }),
  },
  {
    path: "athletes/[id]/tests/upload",
    method: "POST",
    may: "tests.write",
    body: () => ({ uploadId: randomUUID(), rows: [TRIAL] }),
    params: ({ athleteId }) => ({ id: athleteId }),
  },
  {
    path: "athletes/[id]/csv/[what]",
    method: "GET",
    may: null,
    params: ({ athleteId }) => ({ id: athleteId, what: "tests" }),
  },
  { path: "tests/[id]", method: "DELETE", may: "tests.write", params: ({ trialId }) => ({ id: trialId }) },
  {
    path: "tests/[id]/restore",
    method: "POST",
    may: "tests.write",
    params: ({ trialId }) => ({ id: trialId }),
  },
  {
    path: "test-uploads/[id]",
    method: "DELETE",
    may: "tests.write",
    params: ({ uploadId }) => ({ id: uploadId }),
  },
  { path: "house-rules", method: "GET", may: "rules.read" },
  {
    path: "house-rules",
    method: "PUT",
    may: "rules.write",
    body: () => ({ overrides: { "clash.gap": 60 } }),
  },
  { path: "timetable", method: "GET", may: "timetable.read" },
  { path: "timetable", method: "POST", may: "timetable.write", body: () => SESSION },
  {
    path: "timetable/[id]",
    method: "PUT",
    may: "timetable.write",
    body: () => SESSION,
    params: ({ entryId }) => ({ id: entryId }),
  },
  {
    path: "timetable/[id]",
    method: "DELETE",
    may: "timetable.write",
    params: ({ entryId }) => ({ id: entryId }),
  },
  { path: "exercises", method: "GET", may: "exercises.read" },
  { path: "exercises", method: "POST", may: "exercises.write", body: () => EXERCISE_FORM },
  {
    path: "exercises/[id]",
    method: "GET",
    may: "exercises.read",
    params: ({ exerciseId }) => ({ id: exerciseId }),
  },
  {
    path: "exercises/[id]",
    method: "PUT",
    may: "exercises.write",
    body: () => ({ ...EXERCISE_FORM, changedAt: null }),
    params: ({ exerciseId }) => ({ id: exerciseId }),
  },
  {
    path: "exercises/[id]/shelve",
    method: "POST",
    may: "exercises.write",
    body: () => ({ shelved: true, changedAt: null }),
    params: ({ exerciseId }) => ({ id: exerciseId }),
  },
  {
    path: "exercises/[id]/restore",
    method: "POST",
    may: "exercises.write",
    body: () => ({ changedAt: null }),
    params: ({ exerciseId }) => ({ id: exerciseId }),
  },
  { path: "camps", method: "GET", may: null },
  {
    path: "camps",
    method: "POST",
    may: "camps.create",
    body: ({ athleteId }) => campForm({ athlete: { id: athleteId } }),
  },
  {
    path: "camps/from-start",
    method: "POST",
    may: "camps.create",
    body: () => ({ camp: "bout=2027-01-09&at=20:00&zone=Europe/Lisbon&weeks=6" }),
  },
  { path: "camps/[id]", method: "GET", may: "camps.read", params: ({ campId }) => ({ id: campId }) },
  { path: "camps/[id]/report", method: "GET", may: "report.read", params: ({ campId }) => ({ id: campId }) },
  {
    path: "camps/[id]/report/csv",
    method: "GET",
    may: "report.read",
    params: ({ campId }) => ({ id: campId }),
  },
  {
    path: "camps/[id]/result",
    method: "PUT",
    may: "result.write",
    body: () => ({ result: null }),
    params: ({ campId }) => ({ id: campId }),
  },
  {
    path: "camps/[id]/events",
    method: "GET",
    may: "camps.read",
    params: ({ campId }) => ({ id: campId }),
  },
  {
    path: "camps/[id]/changes",
    method: "GET",
    may: "camps.history",
    params: ({ campId }) => ({ id: campId }),
  },
  {
    path: "camps/[id]/changes",
    method: "POST",
    may: "camps.bout",
    body: () => CHANGE,
    params: ({ campId }) => ({ id: campId }),
  },
  {
    path: "camps/[id]/sessions/[sid]",
    method: "GET",
    may: "camps.read",
    params: ({ campId, liftId }) => ({ id: campId, sid: liftId }),
  },
  {
    path: "camps/[id]/sessions/[sid]/edit",
    method: "PUT",
    may: "prescription.write",
    body: () => ({ base: null, edit: { lines: {}, note: "Slow and clean." } }),
    params: ({ campId, liftId }) => ({ id: campId, sid: liftId }),
  },
  {
    path: "camps/[id]/swaps",
    method: "POST",
    may: "prescription.swap",
    body: () => ({ item: "strength-a", from: "back-squat", to: "front-squat" }),
    params: ({ campId }) => ({ id: campId }),
  },
  {
    path: "camps/[id]/swaps",
    method: "DELETE",
    may: "prescription.swap",
    body: () => ({ item: "strength-a", from: "back-squat" }),
    params: ({ campId }) => ({ id: campId }),
  },
  {
    path: "athletes/[id]/bests",
    method: "GET",
    may: "tests.read",
    params: ({ athleteId }) => ({ id: athleteId }),
  },
  {
    path: "athletes/[id]/bests",
    method: "POST",
    may: "bests.write",
    body: () => BEST,
    params: ({ athleteId }) => ({ id: athleteId }),
  },
  {
    path: "bests/[id]",
    method: "DELETE",
    may: "bests.write",
    params: ({ bestId }) => ({ id: bestId }),
  },
  { path: "today", method: "GET", may: null },
  {
    path: "camps/[id]/sessions/[sid]/log",
    method: "PUT",
    may: "logs.write",
    body: () => ({ key: randomUUID(), baseVersion: 0, log: LOG }),
    params: ({ campId, sessionId }) => ({ id: campId, sid: sessionId }),
  },
  {
    path: "camps/[id]/sessions/[sid]/request",
    method: "POST",
    may: "requests.ask",
    body: () => ({ key: randomUUID(), reason: "Exam." }),
    params: ({ campId, sessionId }) => ({ id: campId, sid: sessionId }),
  },
  {
    path: "requests/[id]/answer",
    method: "POST",
    may: "requests.answer",
    body: () => ({ state: "accepted", answer: "" }),
    params: ({ requestId }) => ({ id: requestId }),
  },
  {
    path: "requests/[id]/withdraw",
    method: "POST",
    may: "requests.ask",
    params: ({ requestId }) => ({ id: requestId }),
  },
  {
    path: "athletes/[id]/check-ins/[date]",
    method: "PUT",
    may: "checkins.write",
    body: () => ({ sleep: 2, fatigue: 3, soreness: 4, stress: 2 }),
    params: ({ athleteId }) => ({ id: athleteId, date: "2026-12-01" }),
  },
  {
    path: "athletes/[id]/weights/[date]",
    method: "PUT",
    may: "weight.write",
    body: () => ({ kg: 63.2 }),
    params: ({ athleteId }) => ({ id: athleteId, date: "2026-12-01" }),
  },
  {
    path: "athletes/[id]/weights/[date]",
    method: "DELETE",
    may: "weight.write",
    params: ({ athleteId }) => ({ id: athleteId, date: "2026-12-01" }),
  },
  { path: "feeds", method: "GET", may: "account.own" },
  {
    path: "feeds",
    method: "POST",
    may: null,
    body: ({ athleteId }) => ({ scope: "athlete", athleteId, discreet: false }),
  },
  { path: "feeds/[id]", method: "POST", may: "account.own", params: ({ feedId }) => ({ id: feedId }) },
  { path: "feeds/[id]", method: "DELETE", may: "account.own", params: ({ feedId }) => ({ id: feedId }) },
];

/** Routes that anyone may call; each has its own tests. */
export const OPEN_ROUTES = [
  "auth/[...nextauth]",
  "health",
  "invites/accept",
  "live",
  "plan",
  "reset",
  "reset/confirm",
  "sign-up",
  "unsubscribe/[token]",
];

/** The call that a row describes, about what belongs to `scene`. */
export const callOf = ({ method, body, params }: RouteRow, scene: Scene): Call => ({
  method,
  ...(body && { body: body(scene) }),
  ...(params && { params: params(scene) }),
});
