import { can, type Action, type Member } from "@/lib/policy";

interface NavEntry {
  readonly href: string;
  readonly label: string;
  /** What one must be allowed to do team-wide; null where everyone has something to see. */
  readonly action: Action | null;
}

const ENTRIES: readonly NavEntry[] = [
  { href: "/board", label: "Board", action: "athletes.read" },
  { href: "/camps", label: "Camps", action: null },
  { href: "/athletes", label: "Athletes", action: "athletes.read" },
  { href: "/timetable", label: "Timetable", action: "timetable.read" },
  { href: "/house-rules", label: "House rules", action: "rules.read" },
];

export type NavItem = Pick<NavEntry, "href" | "label">;

/** The pages that the bar leads this member to. */
export const navFor = (member: Member): NavItem[] =>
  ENTRIES.filter(({ action }) => action === null || can(member, action)).map(({ href, label }) => ({
    href,
    label,
  }));
