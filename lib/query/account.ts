"use client";

import { queryOptions, useQuery } from "@tanstack/react-query";
import type { AccountForm, AccountView, PasswordChange, TeamForm, TeamView } from "@/lib/schemas/account";
import { sendJson } from "./send";
import { signIn } from "./sign-in";
import { useChange } from "./use-change";

const accountQuery = queryOptions({
  queryKey: ["account"],
  queryFn: () => sendJson<AccountView>("/api/account"),
});

/** One's own account; `initial` is what the server rendered. */
export const useAccount = (initial: AccountView) => useQuery({ ...accountQuery, initialData: initial });

export const useSaveAccount = () =>
  useChange((form: AccountForm) => sendJson<AccountView>("/api/account", form, "PUT"), accountQuery.queryKey);

/** Changes the password. All sessions end with it, so this page signs in again at once. */
export const useChangePassword = (email: string) =>
  useChange(async (form: PasswordChange) => {
    await sendJson<null>("/api/account/password", form);
    await signIn(email, form.password);
  });

export const useSwitchTeam = () =>
  useChange((teamId: string) => sendJson<null>("/api/account/team", { teamId }));

export const useSaveTeam = () =>
  useChange((form: TeamForm) => sendJson<TeamView>("/api/team", form, "PUT"), accountQuery.queryKey);
