import type { Tx } from "../client";
import { auditLog } from "../schema";

/** Notes who did what, in the transaction that did it. `subject` is the id of what it was done to. */
export async function writeAudit(
  tx: Tx,
  actor: { readonly teamId: string; readonly userId: string; readonly now: Date },
  action: string,
  subject: string,
  detail: Record<string, unknown> = {},
): Promise<void> {
  await tx
    .insert(auditLog)
    .values({ teamId: actor.teamId, userId: actor.userId, action, subject, detail, createdAt: actor.now });
}
