"use client";

import { useMutation, useQueryClient, type QueryKey } from "@tanstack/react-query";

/** A change on the server, after which what was read under `stale` is read again. */
export function useChange<V, R>(change: (values: V) => Promise<R>, ...stale: readonly QueryKey[]) {
  const client = useQueryClient();
  return useMutation({
    mutationFn: change,
    onSettled: () => Promise.all(stale.map((queryKey) => client.invalidateQueries({ queryKey }))),
  });
}
