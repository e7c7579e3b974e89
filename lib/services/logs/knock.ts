import { insertHold, listHolds } from "@/db/queries/holds";
import { listMembers } from "@/db/queries/memberships";
import { writeAudit } from "@/db/queries/audit";
import type { Tx } from "@/db/client";
import { dayFromIso, isoFromDay } from "@/lib/engine";
import type { Day } from "@/lib/engine/types";
import { dayText } from "@/lib/format/civil";
import { queueMail } from "@/lib/mail/queue";
import { knockMail } from "@/lib/mail/templates/knock";
import type { SessionLog } from "@/lib/schemas/today";
import { replanAthlete } from "@/lib/services/camps/replan";
import type { TeamContext } from "@/lib/services/context";

interface KnockIn {
  readonly campId: string;
  readonly sessionId: string;
  readonly athlete: { readonly id: string; readonly name: string };
  /** "Hard sparring on Sat 5 Dec". */
  readonly session: string;
  /** Day of the session, YYYY-MM-DD. */
  readonly day: string;
  readonly log: SessionLog;
}

/** Sets an open-ended hold from the day after the session; null where one stands then already. */
async function holdFor(tx: Tx, ctx: TeamContext, { athlete, session, day }: KnockIn): Promise<Day | null> {
  const from = (dayFromIso(day) + 1) as Day;
  const fromDay = isoFromDay(from);
  const standing = (await listHolds(tx, ctx.teamId, athlete.id)).some(
    ({ hold }) => hold.liftedAt === null && hold.toDay === null && hold.fromDay <= fromDay,
  );
  if (standing) return null;
  const id = await insertHold(tx, ctx.teamId, {
    athleteId: athlete.id,
    fromDay,
    toDay: null,
    reason: `Reported a knock to the head in ${session}.`,
    setBy: ctx.userId,
    createdAt: ctx.now,
  });
  await writeAudit(tx, ctx, "hold.set", id, { athleteId: athlete.id, from: fromDay, to: null });
  return from;
}

const saidIn = ({ note, pain, painPlace }: SessionLog): string[] => [
  ...(note === "" ? [] : [`In their words: ${note}`]),
  ...(pain === null || pain === 0 ? [] : [`Pain ${pain} of 10: ${painPlace}.`]),
];

/**
 * What follows a knock to the head, in the transaction that keeps the log: contact and lifting stop being planned until the medic
 * says otherwise, and head coach and medic are told at once.
 */
export async function actOnKnock(tx: Tx, ctx: TeamContext, knock: KnockIn): Promise<void> {
  const from = await holdFor(tx, ctx, knock);
  if (from !== null) await replanAthlete(tx, ctx, knock.athlete.id, "A hold was set");
  const members = await listMembers(tx, ctx.teamId);
  for (const { userId, email, role } of members) {
    if ((role !== "head" && role !== "medic") || userId === ctx.userId) continue;
    await queueMail(tx, {
      key: `knock:${knock.campId}:${knock.sessionId}:${userId}`,
      kind: "knock",
      to: email,
      userId,
      teamId: ctx.teamId,
      ...knockMail({
        athlete: knock.athlete.name,
        athleteId: knock.athlete.id,
        session: knock.session,
        heldFrom: from === null ? null : dayText(from),
        said: role === "medic" ? saidIn(knock.log) : null,
      }),
    });
  }
}
