"use client";

import { useBrowserZone } from "@/components/start/use-zone";
import { sendJson } from "@/lib/query/send";
import { signIn } from "@/lib/query/sign-in";
import { AccountForm, TextField } from "./account-form";
import { enter } from "./enter";
import { useForm } from "./use-form";

interface InviteFormProps {
  readonly token: string;
  readonly email: string;
  readonly hasAccount: boolean;
  /** Signed in as the one who is invited: nothing to fill in. */
  readonly signedIn: boolean;
}

/** Joins a team: with the session there is, with the password of the account there is, or with a new account. */
export function InviteForm({ token, email, hasAccount, signedIn }: InviteFormProps) {
  const timeZone = useBrowserZone();
  const form = useForm(async ({ name, password }) => {
    const fresh = hasAccount ? {} : { name, timeZone };
    const joined = await sendJson<{ email: string }>("/api/invites/accept", { token, password, ...fresh });
    if (!signedIn) await signIn(joined.email, password ?? "");
    enter("/board");
  });
  return (
    <AccountForm form={form} act="Join the team">
      <TextField
        state={form}
        name="email"
        label="E-mail"
        type="email"
        autoComplete="username"
        value={email}
        readOnly
      />
      {hasAccount ? null : (
        <TextField state={form} name="name" label="Your name" autoComplete="name" maxLength={120} />
      )}
      {signedIn ? null : (
        <TextField
          state={form}
          name="password"
          label={hasAccount ? "Password of your account" : "Choose a password"}
          hint={hasAccount ? undefined : "At least 10 characters. A few words in a row are good."}
          type="password"
          autoComplete={hasAccount ? "current-password" : "new-password"}
          maxLength={200}
        />
      )}
    </AccountForm>
  );
}
