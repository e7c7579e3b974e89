"use client";

import { signIn } from "@/lib/query/sign-in";
import { AccountForm, TextField } from "./account-form";
import { enter } from "./enter";
import { useForm } from "./use-form";

interface SignInFormProps {
  /** Where to go afterwards: a path of this site. */
  readonly next: string;
  readonly email?: string;
}

export function SignInForm({ next, email }: SignInFormProps) {
  const form = useForm(async ({ email: given = "", password = "" }) => {
    await signIn(given.trim(), password);
    enter(next);
  });
  return (
    <AccountForm form={form} act="Sign in">
      <TextField
        state={form}
        name="email"
        label="E-mail"
        type="email"
        autoComplete="username"
        inputMode="email"
        defaultValue={email}
        maxLength={254}
      />
      <TextField
        state={form}
        name="password"
        label="Password"
        type="password"
        autoComplete="current-password"
        maxLength={200}
      />
    </AccountForm>
  );
}
