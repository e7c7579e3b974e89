import { cookies, headers } from "next/headers";
import { redirect } from "next/navigation";
import { cache } from "react";
import { activeMember, type ActiveMember } from "./current-member";
import { PATH_HEADER, signInAddress } from "./next-path";

/** Who looks at this page; null where nobody is signed in. One question to the database a request. */
export const currentMember = cache(async (): Promise<ActiveMember | null> => {
  const header = (await cookies())
    .getAll()
    .map(({ name, value }) => `${name}=${encodeURIComponent(value)}`)
    .join("; ");
  return activeMember(header);
});

/** The same for pages of a team: whoever is not signed in, or no longer in a team, is led to the sign-in and back. */
export async function requireMember(): Promise<ActiveMember> {
  const member = await currentMember();
  if (!member) redirect(signInAddress((await headers()).get(PATH_HEADER)));
  return member;
}
