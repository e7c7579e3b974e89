"use client";

import { queryOptions, useQuery } from "@tanstack/react-query";
import type { BestForm, BestView, BestsView } from "@/lib/schemas/prescription";
import type { TestsView, TrialForm, TrialUpload } from "@/lib/schemas/test-trial";
import { sendJson } from "./send";
import { useChange } from "./use-change";

const athleteUrl = (id: string): string => `/api/athletes/${encodeURIComponent(id)}`;

const testsQuery = (id: string) =>
  queryOptions({
    queryKey: ["athlete", id, "tests"],
    queryFn: () => sendJson<TestsView>(`${athleteUrl(id)}/tests`),
  });
const bestsQuery = (id: string) =>
  queryOptions({
    queryKey: ["athlete", id, "bests"],
    queryFn: () => sendJson<BestsView>(`${athleteUrl(id)}/bests`),
  });

/** Trials with what can be said of them; `initial` is what the server rendered. */
export const useTests = (id: string, initial: TestsView) =>
  useQuery({ ...testsQuery(id), initialData: initial });

export const useAddTrial = (id: string) =>
  useChange(
    (form: TrialForm) => sendJson<{ id: string }>(`${athleteUrl(id)}/tests`, form),
    testsQuery(id).queryKey,
  );

export const useRemoveTrial = (id: string) =>
  useChange(
    (trialId: string) => sendJson<null>(`/api/tests/${encodeURIComponent(trialId)}`, undefined, "DELETE"),
    testsQuery(id).queryKey,
  );

export const useRestoreTrial = (id: string) =>
  useChange(
    (trialId: string) =>
      sendJson<null>(`/api/tests/${encodeURIComponent(trialId)}/restore`, undefined, "POST"),
    testsQuery(id).queryKey,
  );

interface Uploaded {
  readonly uploadId: string;
  readonly count: number;
}

export const useUploadTrials = (id: string) =>
  useChange(
    (upload: TrialUpload) => sendJson<Uploaded>(`${athleteUrl(id)}/tests/upload`, upload),
    testsQuery(id).queryKey,
  );

export const useTakeBackUpload = (id: string) =>
  useChange(
    (uploadId: string) =>
      sendJson<Uploaded>(`/api/test-uploads/${encodeURIComponent(uploadId)}`, undefined, "DELETE"),
    testsQuery(id).queryKey,
  );

/** Bests, newest first; `initial` is what the server rendered. */
export const useBests = (id: string, initial: BestsView) =>
  useQuery({ ...bestsQuery(id), initialData: initial });

export const useAddBest = (id: string) =>
  useChange((form: BestForm) => sendJson<BestView>(`${athleteUrl(id)}/bests`, form), bestsQuery(id).queryKey);

export const useRemoveBest = (id: string) =>
  useChange(
    (bestId: string) => sendJson<null>(`/api/bests/${encodeURIComponent(bestId)}`, undefined, "DELETE"),
    bestsQuery(id).queryKey,
  );
