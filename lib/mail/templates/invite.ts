import { ROLE_TITLES, type Role } from "@/lib/policy";
import { noteMail } from "../layout";
import { oneLine } from "../one-line";
import { mailSettings } from "../settings";

/** Days that an invitation can be accepted. */
export const INVITE_DAYS = 7;

interface Invitation {
  readonly token: string;
  readonly team: string;
  readonly role: Role;
  readonly invitedBy: string;
}

/** The mail that asks someone into a team. Names are other people's words: they stand in one line, and link nowhere. */
export const inviteMail = ({ token, team, role, invitedBy }: Invitation) => ({
  subject: `You are invited to ${oneLine(team)}`,
  ...noteMail({
    heading: `You are invited to ${oneLine(team)}`,
    paragraphs: [
      `${oneLine(invitedBy)} asks you to join ${oneLine(team)} on Bellward. Your role there: ${ROLE_TITLES[role]}.`,
      `The invitation can be accepted for ${INVITE_DAYS} days.`,
    ],
    action: { label: "Join the team", url: `${mailSettings().appUrl}/invite/${token}` },
    footer: "If you do not know these people, do nothing: nothing is kept but this invitation.",
  }),
});
