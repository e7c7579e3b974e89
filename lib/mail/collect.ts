import { findCamp, loadCampParts } from "@/db/queries/camps";
import { insertMail } from "@/db/queries/mails";
import {
  addCollectJobs,
  claimNotices,
  findReader,
  listRevisionsFrom,
  markNotices,
  type NoticeRow,
} from "@/db/queries/notices";
import type { Database, Tx } from "@/db/client";
import { changeMail } from "./change-mail";
import { campSection, type CampSection } from "./change-section";
import { nextDigest } from "./digest-time";
import { listHeaders } from "./list-headers";
import { messageId, queueMail } from "./queue";

type Reader = NonNullable<Awaited<ReturnType<typeof findReader>>>;

export interface CollectRequest {
  readonly userId: string;
  /** Does nothing unless something from before (or at) this instant still waits: an earlier job took it along. */
  readonly since: Date;
  /** The daily mail's job. */
  readonly digest: boolean;
}

export type CollectOutcome = "mailed" | "withheld" | "postponed" | "nothing";

const groupByCamp = (waiting: readonly NoticeRow[]): NoticeRow[][] => {
  const groups = new Map<string, NoticeRow[]>();
  for (const notice of waiting) groups.set(notice.campId, [...(groups.get(notice.campId) ?? []), notice]);
  return [...groups.values()];
};

async function sectionFor(
  tx: Tx,
  reader: Reader,
  told: readonly NoticeRow[],
  now: Date,
): Promise<CampSection | null> {
  const [first] = told;
  const membership = reader.memberships.find(({ teamId }) => teamId === first?.teamId);
  if (!first || !membership) return null;
  const camp = await findCamp(tx, first.teamId, first.campId);
  if (!camp) return null;
  const numbers = new Set(told.map((notice) => notice.revision));
  const revisions = await listRevisionsFrom(tx, camp.teamId, camp.id, Math.min(...numbers));
  return campSection({
    camp,
    parts: await loadCampParts(tx, camp),
    revisions: revisions.map((revision) => ({ ...revision, told: numbers.has(revision.number) })),
    reader: { member: { role: membership.role, athleteId: membership.athleteId }, timeZone: reader.timeZone },
    now,
  });
}

/** Keeps on record that nothing was sent, and of what. */
async function withhold(tx: Tx, reader: Reader, key: string): Promise<string | null> {
  return insertMail(tx, {
    key,
    kind: "changes",
    userId: reader.id,
    recipient: reader.email,
    messageId: messageId(),
    status: "withheld",
    subject: "",
    text: "",
    html: "",
    headers: {},
  });
}

/**
 * Makes one mail of everything that waits for a person, over all camps, as things stand now: what moved and came back is not
 * told, and where nothing is left no mail goes out. Idempotent: a notice is in one mail at most.
 */
export async function collectChanges(
  deps: { db: Database; now: () => Date },
  request: CollectRequest,
): Promise<CollectOutcome> {
  return deps.db.transaction(async (tx) => {
    const waiting = await claimNotices(tx, request.userId);
    const [oldest] = waiting;
    if (!oldest || oldest.createdAt > request.since) return "nothing";
    const reader = await findReader(tx, request.userId);
    if (!reader) return "nothing";
    const now = deps.now();
    if (reader.mailChoice === "daily" && !request.digest) {
      await addCollectJobs(tx, [
        {
          userId: reader.id,
          since: request.since,
          digest: true,
          now,
          runAt: nextDigest(now, reader.timeZone),
        },
      ]);
      return "postponed";
    }
    const sections: CampSection[] = [];
    for (const told of reader.mailChoice === "none" ? [] : groupByCamp(waiting)) {
      const section = await sectionFor(tx, reader, told, now);
      if (section) sections.push(section);
    }
    const key = `changes:${oldest.id}`;
    const mailId =
      sections.length > 0
        ? await queueMail(tx, {
            key,
            kind: "changes",
            to: reader.email,
            userId: reader.id,
            headers: listHeaders(reader.id),
            ...changeMail({ userId: reader.id, timeZone: reader.timeZone }, sections),
          })
        : await withhold(tx, reader, key);
    if (mailId === null) throw new Error("A notice that waits is already in a mail.");
    await markNotices(
      tx,
      waiting.map((notice) => notice.id),
      mailId,
    );
    return sections.length > 0 ? "mailed" : "withheld";
  });
}
