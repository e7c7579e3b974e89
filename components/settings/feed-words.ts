import type { Role } from "@/lib/policy";
import type { FeedView } from "@/lib/schemas/feed";

export interface FollowedAthlete {
  readonly id: string;
  readonly name: string;
}

/** "Your camp", "Tamsin Velloso" or "The whole team". */
export function feedTitle({ athlete }: Pick<FeedView, "athlete">, role: Role): string {
  if (athlete === null) return "The whole team";
  return role === "athlete" ? "Your camp" : athlete.name;
}

const day = (instant: string): string =>
  new Intl.DateTimeFormat("en-GB", { day: "numeric", month: "short", year: "numeric" }).format(
    new Date(instant),
  );

/** When it was made and last read, and what its titles say. */
export function feedFacts({ discreet, createdAt, lastReadAt }: FeedView): string {
  const read = lastReadAt === null ? "not read by a calendar yet" : `last read ${day(lastReadAt)}`;
  return `${discreet ? "Discreet titles" : "Full titles"}, made ${day(createdAt)}, ${read}`;
}

/** The same address under the scheme that calendars register for. */
export const webcalOf = (address: string): string => address.replace(/^https?:/, "webcal:");

/** "https", or "http" on one's own machine. */
export const schemeOf = (address: string): string => address.slice(0, address.indexOf(":"));
