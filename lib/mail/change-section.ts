import type { CampParts, CampRow } from "@/db/queries/camps";
import type { ToldRevision } from "@/db/queries/notices";
import { bookOf } from "@/db/mappers/camp-book";
import { applyEdit, planInputOf } from "@/lib/book";
import { instantOf } from "@/lib/calendar/zones";
import type { PlanInput, SportSession } from "@/lib/engine/types";
import { can, type Member } from "@/lib/policy";
import type { CampBook } from "@/lib/schemas/camp-book";
import { boutLines } from "./bout-lines";
import { linesOf, type ChangeLine } from "./change-lines";
import { netLifts, netSport, type BurstRevision } from "./net-effect";

/** Who reads, in the team that the camp belongs to. */
export interface SectionReader {
  readonly member: Member;
  readonly timeZone: string;
}

/** What one mail says about one camp. */
export interface CampSection {
  readonly campId: string;
  readonly athleteName: string;
  /** The reader is the athlete. */
  readonly own: boolean;
  readonly opponent: string;
  readonly boutDate: string;
  readonly savedBy: readonly string[];
  readonly bout: readonly string[];
  readonly off: boolean;
  readonly lines: readonly ChangeLine[];
  /** House rules that the change breaks and that are still broken. */
  readonly broken: readonly string[];
}

export interface SectionInput {
  readonly camp: CampRow;
  readonly parts: CampParts;
  /** From the first revision that the reader is told of to the newest, in order. */
  readonly revisions: readonly ToldRevision[];
  readonly reader: SectionReader;
  readonly now: Date;
}

/** How the book stood before each of the revisions: the inverse edits, played back from what stands now. */
function booksBefore(book: CampBook, revisions: readonly ToldRevision[]): CampBook[] {
  const books: CampBook[] = [];
  let current = book;
  for (const { inverse } of revisions.toReversed()) {
    if (inverse) current = applyEdit(current, inverse);
    books.unshift(current);
  }
  return books;
}

const byId = ({ sport }: PlanInput): Map<string, SportSession> =>
  new Map(sport.map((session) => [session.id, session]));

const touchesBout = ({ edit, told }: ToldRevision): boolean =>
  told &&
  edit !== null &&
  (edit.bout !== undefined || edit.status !== undefined || edit.weighIn !== undefined);

/** A coach who runs the sport sessions is told what moved, not how much is lifted; others as the policy says. */
const seesSets = (member: Member, athleteId: string): boolean =>
  member.role !== "skills" && can(member, "lifts.detail", athleteId);

/** What to tell one reader about one camp, on balance; null where that is nothing, or nothing of the reader's business. */
export function campSection({ camp, parts, revisions, reader, now }: SectionInput): CampSection | null {
  if (!can(reader.member, "camps.read", camp.athleteId)) return null;
  const book = bookOf({ camp, ...parts });
  const books = booksBefore(book, revisions);
  const first = books[0];
  if (!first) return null;
  const [before, after] = [planInputOf(first, instantOf(now)), planInputOf(book, instantOf(now))];
  const burst: BurstRevision[] = revisions.flatMap(({ knockOn, told }) =>
    knockOn ? [{ knockOn, told }] : [],
  );
  const boutFrom = books[revisions.findIndex(touchesBout)];
  const bout = boutFrom ? boutLines(boutFrom, book, reader.timeZone) : [];
  const off = boutFrom !== undefined && boutFrom.status === "on" && book.status === "off";
  const detail = seesSets(reader.member, camp.athleteId);
  const net = {
    lifts: netLifts(burst, new Set(camp.summary.unplaced.map((slot) => slot.id))),
    sport: netSport(burst, byId(before), byId(after)),
  };
  const lines = linesOf(net, {
    campId: camp.id,
    zoneBefore: before.zone,
    zoneAfter: after.zone,
    readerZone: reader.timeZone,
    detail,
  });
  if (lines.length === 0 && bout.length === 0) return null;
  return {
    campId: camp.id,
    athleteName: parts.athlete.name,
    own: reader.member.role === "athlete",
    opponent: book.bout.opponent,
    boutDate: book.bout.date,
    savedBy: [...new Set(revisions.flatMap(({ told, by }) => (told && by !== null ? [by] : [])))],
    bout,
    off,
    lines,
    broken: detail ? stillBroken(camp, burst) : [],
  };
}

function stillBroken(camp: CampRow, burst: readonly BurstRevision[]): string[] {
  const now = new Set(camp.summary.violations.map((violation) => violation.text));
  const told = burst
    .filter((revision) => revision.told)
    .flatMap(({ knockOn }) => knockOn.violations.map((violation) => violation.text));
  return [...new Set(told)].filter((text) => now.has(text));
}
