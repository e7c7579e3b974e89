import type { Metadata } from "next";
import { cache } from "react";
import { SessionPage } from "@/components/session-page/session-page";
import { orNotFound, pageContext } from "@/lib/http/page";
import { readSession } from "@/lib/services/prescription/session-page";

interface PageProps {
  readonly params: Promise<{ id: string; sid: string }>;
}

/** Days around today that the page of the day shows. */
const NEAR_MS = 36 * 3_600_000;

// The title and the page ask for the same session; it is read once.
const sessionOf = cache(async (id: string, sid: string) => {
  const ctx = await pageContext();
  return { ctx, view: await orNotFound(readSession(ctx, { params: { id, sid } })) };
});

export async function generateMetadata({ params }: PageProps): Promise<Metadata> {
  const { id, sid } = await params;
  const { view } = await sessionOf(id, sid);
  return { title: `${view.session.title} of ${view.athlete.name}` };
}

export default async function Page({ params }: PageProps) {
  const { id, sid } = await params;
  const { ctx, view } = await sessionOf(id, sid);
  const noon = Date.parse(`${view.session.date}T12:00:00Z`);
  const loggable = ctx.member.role === "athlete" && Math.abs(ctx.now.getTime() - noon) < NEAR_MS;
  return <SessionPage key={view.session.id} initial={view} loggable={loggable} />;
}
