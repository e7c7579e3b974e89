import { can, type Action, type Member } from "@/lib/policy";

interface NavEntry {
  readonly href: string;
  readonly label: string;
  /** Whether it leads this member anywhere. */
  readonly shows: (member: Member) => boolean;
}

const may =
  (action: Action) =>
  (member: Member): boolean =>
    can(member, action);

const ENTRIES: readonly NavEntry[] = [
  {
    href: "/today",
    label: "Today",
    shows: ({ role, athleteId }) => role === "athlete" && athleteId !== null,
  },
  { href: "/board", label: "Board", shows: may("athletes.read") },
  { href: "/camps", label: "Camps", shows: () => true },
  { href: "/athletes", label: "Athletes", shows: may("athletes.read") },
  { href: "/timetable", label: "Timetable", shows: may("timetable.read") },
  { href: "/exercises", label: "Exercises", shows: may("exercises.read") },
  { href: "/house-rules", label: "House rules", shows: may("rules.read") },
];

export type NavItem = Pick<NavEntry, "href" | "label">;

/** The pages that the bar leads this member to; an athlete's own page has its own address. */
export const navFor = (member: Member): NavItem[] => {
  const { role, athleteId } = member;
  const own =
    role === "athlete" && athleteId !== null ? [{ href: `/athletes/${athleteId}`, label: "My page" }] : [];
  return [
    ...ENTRIES.filter(({ shows }) => shows(member)).map(({ href, label }) => ({ href, label })),
    ...own,
  ];
};
