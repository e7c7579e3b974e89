"use client";

import { queryOptions, useQuery } from "@tanstack/react-query";
import type { InviteForm, InviteView, PeopleView, RoleChange } from "@/lib/schemas/account";
import { sendJson } from "./send";
import { useChange } from "./use-change";

const peopleQuery = queryOptions({
  queryKey: ["people"],
  queryFn: () => sendJson<PeopleView>("/api/people"),
});

/** Who is in the team, and open invitations; `initial` is what the server rendered. */
export const usePeople = (initial: PeopleView) => useQuery({ ...peopleQuery, initialData: initial });

const personUrl = (id: string): string => `/api/people/${encodeURIComponent(id)}`;

export const useInvite = () =>
  useChange((form: InviteForm) => sendJson<InviteView>("/api/invites", form), peopleQuery.queryKey);

export const useRevokeInvite = () =>
  useChange(
    (id: string) => sendJson<null>(`/api/invites/${encodeURIComponent(id)}`, undefined, "DELETE"),
    peopleQuery.queryKey,
  );

export const useChangeRole = (id: string) =>
  useChange((form: RoleChange) => sendJson<PeopleView>(personUrl(id), form, "PATCH"), peopleQuery.queryKey);

export const useRemovePerson = () =>
  useChange((id: string) => sendJson<null>(personUrl(id), undefined, "DELETE"), peopleQuery.queryKey);
