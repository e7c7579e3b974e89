"use client";

import { queryOptions, useQuery } from "@tanstack/react-query";
import type { TimetableEntry, TimetableForm } from "@/lib/schemas/timetable";
import { sendJson } from "./send";
import { useChange } from "./use-change";

const URL = "/api/timetable";
const entryUrl = (id: string): string => `${URL}/${encodeURIComponent(id)}`;

const timetableQuery = queryOptions({
  queryKey: ["timetable"],
  queryFn: async () => (await sendJson<{ entries: readonly TimetableEntry[] }>(URL)).entries,
});

/** The gym's week; `initial` is what the server rendered. */
export const useTimetable = (initial: readonly TimetableEntry[]) =>
  useQuery({ ...timetableQuery, initialData: initial });

/** Adds a session, or changes the one named. */
export const useSaveEntry = (id: string | null) =>
  useChange(
    (form: TimetableForm) =>
      id === null ? sendJson<TimetableEntry>(URL, form) : sendJson<TimetableEntry>(entryUrl(id), form, "PUT"),
    timetableQuery.queryKey,
  );

export const useDropEntry = () =>
  useChange((id: string) => sendJson<null>(entryUrl(id), undefined, "DELETE"), timetableQuery.queryKey);
