"use client";

import { queryOptions, useQuery } from "@tanstack/react-query";
import type { AthleteForm, AthleteView, HoldForm } from "@/lib/schemas/athlete";
import { sendJson } from "./send";
import { useChange } from "./use-change";

const athleteUrl = (id: string): string => `/api/athletes/${encodeURIComponent(id)}`;

const athleteQuery = (id: string) =>
  queryOptions({ queryKey: ["athlete", id], queryFn: () => sendJson<AthleteView>(athleteUrl(id)) });

/** A profile; `initial` is what the server rendered. */
export const useAthlete = (initial: AthleteView) =>
  useQuery({ ...athleteQuery(initial.id), initialData: initial });

export const useAddAthlete = () =>
  useChange((form: AthleteForm) => sendJson<{ id: string }>("/api/athletes", form));

export const useSaveAthlete = (id: string) =>
  useChange(
    (form: AthleteForm) => sendJson<AthleteView>(athleteUrl(id), form, "PUT"),
    athleteQuery(id).queryKey,
  );

/** What a hold did: how many open camps were planned again. */
interface HoldSaved {
  readonly replanned: number;
}

export const useSetHold = (athleteId: string) =>
  useChange(
    (form: HoldForm) => sendJson<HoldSaved>(`${athleteUrl(athleteId)}/holds`, form),
    athleteQuery(athleteId).queryKey,
  );

export const useLiftHold = (athleteId: string) =>
  useChange(
    (id: string) => sendJson<HoldSaved>(`/api/holds/${encodeURIComponent(id)}/lift`, undefined, "POST"),
    athleteQuery(athleteId).queryKey,
  );
