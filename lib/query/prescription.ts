"use client";

import { queryOptions, useQuery } from "@tanstack/react-query";
import type { DropSwap, SaveEdit, SessionPageView, SwapForm } from "@/lib/schemas/prescription";
import { sendJson } from "./send";
import { useChange } from "./use-change";

const campUrl = (campId: string): string => `/api/camps/${encodeURIComponent(campId)}`;
const sessionUrl = (campId: string, id: string): string =>
  `${campUrl(campId)}/sessions/${encodeURIComponent(id)}`;

// All sessions of a camp lie under one key: a swap changes more than the one that is open.
const ofCamp = (campId: string) => ["camp-session", campId] as const;

const sessionQuery = (campId: string, id: string) =>
  queryOptions({
    queryKey: [...ofCamp(campId), id],
    queryFn: () => sendJson<SessionPageView>(sessionUrl(campId, id)),
  });

/** One session with its prescription; `initial` is what the server rendered. */
export const useSession = (initial: SessionPageView) =>
  useQuery({ ...sessionQuery(initial.campId, initial.session.id), initialData: initial });

/** Writes the whole of what a coach says over one lift. */
export const useSaveEdit = (campId: string, id: string) =>
  useChange(
    (body: SaveEdit) => sendJson<SessionPageView>(`${sessionUrl(campId, id)}/edit`, body, "PUT"),
    ofCamp(campId),
  );

export const useSwap = (campId: string) =>
  useChange((form: SwapForm) => sendJson<unknown>(`${campUrl(campId)}/swaps`, form), ofCamp(campId));

export const useDropSwap = (campId: string) =>
  useChange(
    (form: DropSwap) => sendJson<unknown>(`${campUrl(campId)}/swaps`, form, "DELETE"),
    ofCamp(campId),
  );
