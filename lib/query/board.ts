"use client";

import { queryOptions, useQuery } from "@tanstack/react-query";
import type { BoardView } from "@/lib/schemas/board";
import { sendJson } from "./send";

/** How often an open board asks, milliseconds. */
const POLL_MS = 30_000;

export const boardQuery = queryOptions({
  queryKey: ["board"],
  queryFn: () => sendJson<BoardView>("/api/board"),
});

/** The board; `initial` is what the server rendered. */
export const useBoard = (initial: BoardView) =>
  useQuery({ ...boardQuery, initialData: initial, refetchInterval: POLL_MS });
