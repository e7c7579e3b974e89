"use client";

import { queryOptions, useQuery } from "@tanstack/react-query";
import type { ReportView, ResultForm } from "@/lib/schemas/report";
import { sendJson } from "./send";
import { useChange } from "./use-change";

const campUrl = (id: string): string => `/api/camps/${encodeURIComponent(id)}`;

const reportQuery = (id: string) =>
  queryOptions({ queryKey: ["report", id], queryFn: () => sendJson<ReportView>(`${campUrl(id)}/report`) });

/** The report; `initial` is what the server rendered. */
export const useReport = (initial: ReportView) =>
  useQuery({ ...reportQuery(initial.campId), initialData: initial });

export const useRecordResult = (campId: string) =>
  useChange(
    (form: ResultForm) => sendJson<ReportView>(`${campUrl(campId)}/result`, form, "PUT"),
    reportQuery(campId).queryKey,
  );
