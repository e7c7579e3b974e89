"use client";

import { queryOptions, useMutation, useQuery, useQueryClient } from "@tanstack/react-query";
import type { FeedForm, FeedView, NewFeed } from "@/lib/schemas/feed";
import { sendJson } from "./send";

const URL = "/api/feeds";
const feedUrl = (id: string): string => `${URL}/${encodeURIComponent(id)}`;

const feedsQuery = queryOptions({
  queryKey: ["feeds"],
  queryFn: async () => (await sendJson<{ feeds: readonly FeedView[] }>(URL)).feeds,
});

/** One's own calendar subscriptions. */
export const useFeeds = () => useQuery(feedsQuery);

function useFeedMutation<V, R>(mutationFn: (values: V) => Promise<R>) {
  const client = useQueryClient();
  return useMutation({
    mutationFn,
    onSettled: () => client.invalidateQueries({ queryKey: feedsQuery.queryKey }),
  });
}

/** Makes a subscription; the answer holds its address, once. */
export const useCreateFeed = () => useFeedMutation((form: FeedForm) => sendJson<NewFeed>(URL, form));

/** Gives it a new address, once; the old one ends. */
export const useRenewFeed = () =>
  useFeedMutation((id: string) => sendJson<NewFeed>(feedUrl(id), undefined, "POST"));

/** Ends it. */
export const useRevokeFeed = () =>
  useFeedMutation((id: string) => sendJson<null>(feedUrl(id), undefined, "DELETE"));
