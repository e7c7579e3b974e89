import type { Metadata } from "next";
import { redirect } from "next/navigation";
import { TodayPage } from "@/components/today/today-page";
import { orNotFound, pageContext } from "@/lib/http/page";
import { readToday } from "@/lib/services/today/read-today";

export const metadata: Metadata = { title: "Today" };

export default async function Page() {
  const ctx = await pageContext();
  // The installed application starts here, whoever installed it.
  if (ctx.member.role !== "athlete") redirect("/board");
  const view = await orNotFound(readToday(ctx));
  return <TodayPage initial={view} userId={ctx.userId} />;
}
