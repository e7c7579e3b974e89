import type { Metadata } from "next";
import { TodayPage } from "@/components/today/today-page";
import { orNotFound, pageContext } from "@/lib/http/page";
import { readToday } from "@/lib/services/today/read-today";

export const metadata: Metadata = { title: "Today" };

export default async function Page() {
  const ctx = await pageContext();
  const view = await orNotFound(readToday(ctx));
  return <TodayPage initial={view} userId={ctx.userId} />;
}
