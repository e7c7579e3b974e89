import { can, type Member } from "@/lib/policy";

/** Whose calendar: null is the whole team's. */
export const mayFollow = (member: Member, athleteId: string | null): boolean =>
  can(member, "feeds.team") || (athleteId !== null && can(member, "feeds.own", athleteId));
