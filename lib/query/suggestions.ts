"use client";

import { queryOptions, useQuery } from "@tanstack/react-query";
import type { RequestView } from "@/lib/schemas/today";
import type {
  AcceptAnswer,
  AcceptSuggestion,
  DecisionView,
  DismissSuggestion,
  WaitingView,
} from "@/lib/schemas/suggestion";
import { boardQuery } from "./board";
import { campQuery } from "./camps";
import { sendJson } from "./send";
import { useChange } from "./use-change";

const suggestionsUrl = (campId: string): string => `/api/camps/${encodeURIComponent(campId)}/suggestions`;
const suggestionUrl = (campId: string, key: string, act: string): string =>
  `${suggestionsUrl(campId)}/${encodeURIComponent(key)}/${act}`;

const waitingQuery = (campId: string) =>
  queryOptions({
    // Under the camp's own key: what a saved change does to the suggestions is read again with it.
    queryKey: [...campQuery(campId).queryKey, "waiting"],
    queryFn: () => sendJson<WaitingView>(suggestionsUrl(campId)),
  });

/** What of a camp waits for a coach; for those who may decide. */
export const useWaiting = (campId: string) => useQuery(waitingQuery(campId));

/** `onAccepted` hears of it before the camp is read again. */
export const useAcceptSuggestion = (campId: string, onAccepted: (answer: AcceptAnswer) => void) =>
  useChange(
    async ({ key, ...body }: AcceptSuggestion & { readonly key: string }) => {
      const answer = await sendJson<AcceptAnswer>(suggestionUrl(campId, key, "accept"), body);
      onAccepted(answer);
      return answer;
    },
    campQuery(campId).queryKey,
    boardQuery.queryKey,
  );

export const useDismissSuggestion = (campId: string) =>
  useChange(
    ({ key, ...body }: DismissSuggestion & { readonly key: string }) =>
      sendJson<{ decision: DecisionView }>(suggestionUrl(campId, key, "dismiss"), body),
    campQuery(campId).queryKey,
    boardQuery.queryKey,
  );

/** Answers "I can't make it". No plan is changed by it. */
export const useAnswerRequest = (campId: string) =>
  useChange(
    ({
      id,
      ...body
    }: {
      readonly id: string;
      readonly state: "accepted" | "declined";
      readonly answer: string;
    }) => sendJson<RequestView>(`/api/requests/${encodeURIComponent(id)}/answer`, body),
    campQuery(campId).queryKey,
    boardQuery.queryKey,
  );
