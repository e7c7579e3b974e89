"use client";

import { useState } from "react";
import { Notice } from "@/components/ui/notice";
import { sendJson } from "@/lib/query/send";
import { AccountForm, TextField } from "./account-form";
import { enter } from "./enter";
import { useForm } from "./use-form";

/** Asks for a link. What it says is the same whether there is an account or not. */
export function ResetRequestForm() {
  const [asked, setAsked] = useState<string | null>(null);
  const form = useForm(async ({ email = "" }) => {
    await sendJson("/api/reset", { email });
    setAsked(email.trim());
  });
  if (asked !== null) {
    return (
      <Notice role="status" title="Check your mail">
        <p>If {asked} has an account, a link is on its way. It works once, for 30 minutes.</p>
      </Notice>
    );
  }
  return (
    <AccountForm form={form} act="Send me a link">
      <TextField
        state={form}
        name="email"
        label="E-mail"
        type="email"
        inputMode="email"
        autoComplete="username"
        maxLength={254}
      />
    </AccountForm>
  );
}

/** Sets the new password. */
export function ResetConfirmForm({ token }: { readonly token: string }) {
  const form = useForm(async ({ password = "" }) => {
    await sendJson("/api/reset/confirm", { token, password });
    enter("/sign-in?said=reset");
  });
  return (
    <AccountForm form={form} act="Set the password">
      <TextField
        state={form}
        name="password"
        label="New password"
        hint="At least 10 characters. A few words in a row are good."
        type="password"
        autoComplete="new-password"
        maxLength={200}
      />
    </AccountForm>
  );
}
