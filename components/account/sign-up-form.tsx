"use client";

import { useState } from "react";
import { useBrowserZone } from "@/components/start/use-zone";
import { ZoneSelect } from "@/components/start/zone-select";
import { Field } from "@/components/ui/field";
import { Notice } from "@/components/ui/notice";
import { ProblemError, sendJson } from "@/lib/query/send";
import { signIn } from "@/lib/query/sign-in";
import { AccountForm, TextField } from "./account-form";
import { enter } from "./enter";
import { useForm } from "./use-form";

interface SignUpFormProps {
  /** Inputs of the start page, as its address holds them; null where nothing is carried over. */
  readonly camp: string | null;
}

/** The camp from the start page, kept; where that fails, the form for a new camp with the same inputs. */
async function firstPage(camp: string | null): Promise<string> {
  if (camp === null) return "/camps/new";
  try {
    const { id } = await sendJson<{ id: string }>("/api/camps/from-start", { camp });
    return `/camps/${id}`;
  } catch {
    return `/camps/new?camp=${encodeURIComponent(camp)}`;
  }
}

/** Signs in with what was typed. False where that does not work: the e-mail has an account with another password. */
async function entered(email: string, password: string): Promise<boolean> {
  try {
    await signIn(email, password);
    return true;
  } catch (error) {
    if (error instanceof ProblemError && error.problem.status === 401) return false;
    throw error;
  }
}

export function SignUpForm({ camp }: SignUpFormProps) {
  const here = useBrowserZone();
  const [zone, setZone] = useState<string | null>(null);
  const [mailed, setMailed] = useState<string | null>(null);
  const form = useForm(async ({ email: typed = "", password = "", ...texts }) => {
    const email = typed.trim();
    await sendJson("/api/sign-up", { ...texts, email, password, timeZone: zone ?? here });
    if (await entered(email, password)) enter(await firstPage(camp));
    else setMailed(email);
  });
  if (mailed !== null) {
    return (
      <Notice role="status" title="Check your mail to go on">
        <p>
          We sent a mail to {mailed}. It says how to get in.
          {camp === null ? null : " Your camp is still in the address of the start page: go back to see it."}
        </p>
      </Notice>
    );
  }
  return (
    <AccountForm form={form} act={camp === null ? "Make the team" : "Make the team and keep the camp"}>
      <TextField state={form} name="name" label="Your name" autoComplete="name" maxLength={120} />
      <TextField
        state={form}
        name="email"
        label="E-mail"
        type="email"
        inputMode="email"
        autoComplete="username"
        maxLength={254}
      />
      <TextField
        state={form}
        name="password"
        label="Password"
        hint="At least 10 characters. A few words in a row are good."
        type="password"
        autoComplete="new-password"
        maxLength={200}
      />
      <TextField state={form} name="team" label="Team or gym" autoComplete="organization" maxLength={120} />
      <Field label="Time zone of the gym" error={form.error("timeZone")}>
        <ZoneSelect name="timeZone" value={zone ?? here} onChange={setZone} />
      </Field>
    </AccountForm>
  );
}
