import { z } from "zod";
import { ROLES, type Role } from "@/lib/policy/roles";
import { timeZone } from "./civil";

/** At least 10 characters and no other rule (NIST SP 800-63B 5.1.1.2: length counts, composition rules do not help). */
export const PASSWORD_MIN = 10;
/** Far above any passphrase; hashing must not become a way to keep the server busy. */
export const PASSWORD_MAX = 200;

export const newPassword = z
  .string()
  .min(PASSWORD_MIN, `At least ${PASSWORD_MIN} characters.`)
  .max(PASSWORD_MAX, `At most ${PASSWORD_MAX} characters.`);
const givenPassword = z
  .string()
  .min(1, "Give your password.")
  .max(PASSWORD_MAX, `At most ${PASSWORD_MAX} characters.`);
/** One line: names stand in subjects of mails. */
const line = (most: number, missing: string) =>
  z
    .string()
    .trim()
    .min(1, missing)
    .max(most, `At most ${most} characters.`)
    .regex(/^\P{Cc}*$/u, "One line, please.");
export const personName = line(120, "Give a name.");
const teamName = line(120, "Give the team a name.");
export const email = z
  .string()
  .trim()
  .max(254, "At most 254 characters.")
  .pipe(z.email("Give an e-mail address, like name@example.org."));
const secret = z.string().min(1).max(100);

export const signUpSchema = z.object({
  name: personName,
  email,
  password: newPassword,
  team: teamName,
  timeZone,
});
export type SignUp = z.infer<typeof signUpSchema>;

export const resetRequestSchema = z.object({ email });
export type ResetRequest = z.infer<typeof resetRequestSchema>;

export const resetConfirmSchema = z.object({ token: secret, password: newPassword });
export type ResetConfirm = z.infer<typeof resetConfirmSchema>;

const role = z.enum(ROLES);
const needsAthlete = ({ role, athleteId }: { role: Role; athleteId: string | null }): boolean =>
  (role === "athlete" || role === "guest") === (athleteId !== null);
const ATHLETE_NEEDED = {
  path: ["athleteId"],
  message: "An athlete or guest belongs to one athlete; nobody else does.",
};

export const inviteSchema = z
  .object({ email, role, athleteId: z.uuid().nullable() })
  .refine(needsAthlete, ATHLETE_NEEDED);
export type InviteForm = z.infer<typeof inviteSchema>;

/** `name` for someone new; `password` is the new one, or that of the account there is. Neither for who is signed in. */
export const acceptInviteSchema = z.object({
  token: secret,
  name: personName.optional(),
  password: z.string().max(PASSWORD_MAX, `At most ${PASSWORD_MAX} characters.`).optional(),
  timeZone: timeZone.optional(),
});
export type AcceptInvite = z.infer<typeof acceptInviteSchema>;

export const roleChangeSchema = z
  .object({ role, athleteId: z.uuid().nullable() })
  .refine(needsAthlete, ATHLETE_NEEDED);
export type RoleChange = z.infer<typeof roleChangeSchema>;

export const accountSchema = z.object({
  name: personName,
  units: z.enum(["kg", "lb"]),
  timeZone,
  mailChoice: z.enum(["each", "daily", "none"]),
});
export type AccountForm = z.infer<typeof accountSchema>;

export const passwordChangeSchema = z.object({ current: givenPassword, password: newPassword });
export type PasswordChange = z.infer<typeof passwordChangeSchema>;

export const teamChoiceSchema = z.object({ teamId: z.uuid() });
export type TeamChoice = z.infer<typeof teamChoiceSchema>;

export const teamSchema = z.object({ name: teamName, timeZone });
export type TeamForm = z.infer<typeof teamSchema>;

/** One's own account, and the teams one is in. */
export interface AccountView extends AccountForm {
  readonly email: string;
  readonly teams: readonly {
    readonly id: string;
    readonly name: string;
    readonly role: Role;
    readonly current: boolean;
  }[];
}

export interface PersonView {
  readonly id: string;
  readonly name: string;
  readonly email: string;
  readonly role: Role;
  readonly athleteId: string | null;
  readonly self: boolean;
}

export interface InviteView {
  readonly id: string;
  readonly email: string;
  readonly role: Role;
  readonly athleteId: string | null;
  readonly expiresAt: string;
  readonly expired: boolean;
}

/** Invitations are for those who may send them; to others the list is empty. */
export interface PeopleView {
  readonly people: readonly PersonView[];
  readonly invites: readonly InviteView[];
}

export interface TeamView extends TeamForm {
  readonly id: string;
}
