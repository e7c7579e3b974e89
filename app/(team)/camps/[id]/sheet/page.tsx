import type { Metadata } from "next";
import { SheetPage } from "@/components/sheet/sheet-page";
import { orNotFound, pageContext } from "@/lib/http/page";
import { readSheet } from "@/lib/services/prescription/sheet";

export const metadata: Metadata = { title: "Sheet of a camp week" };

interface PageProps {
  readonly params: Promise<{ id: string }>;
  readonly searchParams: Promise<{ week?: string | string[] }>;
}

export default async function Page({ params, searchParams }: PageProps) {
  const { id } = await params;
  const [week = null] = [(await searchParams).week ?? []].flat();
  const ctx = await pageContext();
  const view = await orNotFound(readSheet(ctx, { campId: id, week }));
  return <SheetPage key={view.week.weeksOut} view={view} />;
}
