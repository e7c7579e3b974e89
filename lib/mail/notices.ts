import type { Tx } from "@/db/client";
import { addCollectJobs, insertNotices, listReaders } from "@/db/queries/notices";
import { nextDigest } from "./digest-time";

/** How long a burst of changes is collected from its first change on, milliseconds (2 minutes). */
const COLLECT_MS = 2 * 60_000;

export interface ChangeNotice {
  readonly teamId: string;
  readonly campId: string;
  readonly revision: number;
  /** People concerned, without the one who saved. */
  readonly userIds: readonly string[];
  /** Something within 48 hours changed: told at once. */
  readonly urgent: boolean;
  readonly now: Date;
}

/**
 * Notes whom a saved revision concerns and sees to it that they get one mail: in 2 minutes, at once where it is urgent, at
 * 06:00 of their zone for those who chose one a day, never for those who chose none. Runs in the transaction of the change.
 */
export async function queueChangeMail(tx: Tx, notice: ChangeNotice): Promise<void> {
  const { urgent, now, ...revision } = notice;
  if (notice.userIds.length === 0) return;
  const readers = await listReaders(tx, notice.userIds);
  const fresh = new Set(
    await insertNotices(tx, { ...revision, userIds: readers.map((reader) => reader.userId), now }),
  );
  const soon = urgent ? now : new Date(now.getTime() + COLLECT_MS);
  await addCollectJobs(
    tx,
    readers
      .filter((reader) => fresh.has(reader.userId))
      .map(({ userId, mailChoice, timeZone }) => {
        const digest = mailChoice === "daily";
        return { userId, since: now, digest, now, runAt: digest ? nextDigest(now, timeZone) : soon };
      }),
  );
}
