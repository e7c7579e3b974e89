import type { Metadata } from "next";
import { ReportPage } from "@/components/report/report-page";
import { orNotFound, pageContext } from "@/lib/http/page";
import { readReport } from "@/lib/services/report/read-report";

export const metadata: Metadata = { title: "Report of a camp" };

interface PageProps {
  readonly params: Promise<{ id: string }>;
}

export default async function Page({ params }: PageProps) {
  const { id } = await params;
  const ctx = await pageContext("report.read");
  return <ReportPage initial={await orNotFound(readReport(ctx, { params: { id } }))} />;
}
