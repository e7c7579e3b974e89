"use client";

import { queryOptions, useQuery } from "@tanstack/react-query";
import type { CampForm, CampView, ChangeView, SaveAnswer } from "@/lib/schemas/camp";
import type { SaveChange } from "@/lib/schemas/change";
import { ProblemError, sendJson, type Problem } from "./send";

const campUrl = (id: string): string => `/api/camps/${encodeURIComponent(id)}`;

/** How often an open page asks when it is not being told, milliseconds. */
export const POLL_MS = 3000;

export const campQuery = (id: string) =>
  queryOptions({ queryKey: ["camp", id], queryFn: () => sendJson<CampView>(campUrl(id)) });

export const changesQuery = (id: string) =>
  queryOptions({
    queryKey: ["camp", id, "changes"],
    queryFn: async () =>
      (await sendJson<{ changes: readonly ChangeView[] }>(`${campUrl(id)}/changes`)).changes,
  });

/** A refusal (signed out, removed from the team) does not go away by asking again. */
const refused = (error: Error | null): boolean =>
  error instanceof ProblemError && error.problem.status >= 400 && error.problem.status < 500;

/** A camp as it stands; `initial` is what the server rendered. `told`: a live line is open, so there is no need to ask. */
export const useCamp = (initial: CampView, told: boolean) =>
  useQuery({
    ...campQuery(initial.id),
    initialData: initial,
    refetchInterval: ({ state }) => (told || refused(state.error) ? false : POLL_MS),
  });

export const useChanges = (id: string, initial: readonly ChangeView[]) =>
  useQuery({ ...changesQuery(id), initialData: initial });

export const saveChange = (id: string, body: SaveChange): Promise<SaveAnswer> =>
  sendJson<SaveAnswer>(`${campUrl(id)}/changes`, body);

export const createCamp = (form: CampForm): Promise<{ id: string }> => sendJson("/api/camps", form);

export const campEventsUrl = (id: string): string => `${campUrl(id)}/events`;

/** Who changed what since the revision that a save was based on. */
export type MissedChange = Pick<ChangeView, "number" | "by" | "at" | "summary">;

/** What a stale save is answered with: who changed what, and the camp as it stands now. */
export interface StaleProblem extends Problem {
  readonly revision: number;
  readonly changes: readonly MissedChange[];
  readonly view: CampView;
}

/** The stale problem in an error, or null where it is another one. */
export function staleProblem(error: unknown): StaleProblem | null {
  if (!(error instanceof ProblemError) || error.problem.status !== 409) return null;
  const problem = error.problem as Partial<StaleProblem> & Problem;
  return problem.view && problem.changes ? (problem as StaleProblem) : null;
}
