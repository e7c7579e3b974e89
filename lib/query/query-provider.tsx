"use client";

import { QueryClient, QueryClientProvider } from "@tanstack/react-query";
import { useState, type ReactNode } from "react";
import { ProblemError } from "./send";

/** A refusal stays a refusal; only what never got an answer, or a broken server, is worth asking again. */
const worthRetrying = (failures: number, error: Error): boolean =>
  failures < 2 &&
  (!(error instanceof ProblemError) || error.problem.status === 0 || error.problem.status >= 500);

/** The browser's copy of what the server said. One per page that asks. */
export function QueryProvider({ children }: { readonly children: ReactNode }) {
  const [client] = useState(
    () => new QueryClient({ defaultOptions: { queries: { retry: worthRetrying, staleTime: 5_000 } } }),
  );
  return <QueryClientProvider client={client}>{children}</QueryClientProvider>;
}
