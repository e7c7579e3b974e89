import type { Metadata } from "next";
import { cache } from "react";
import { CampPage } from "@/components/camp/camp-page";
import { instantOf } from "@/lib/calendar/zones";
import { orNotFound, pageContext } from "@/lib/http/page";
import { readCamp } from "@/lib/services/camps/read";

interface PageProps {
  readonly params: Promise<{ id: string }>;
  readonly searchParams: Promise<{ session?: string | string[] }>;
}

// The title and the page ask for the same camp; it is read once.
const campOf = cache(async (id: string) => {
  const ctx = await pageContext();
  return { now: instantOf(ctx.now), view: await orNotFound(readCamp(ctx, { params: { id } })) };
});

export async function generateMetadata({ params }: PageProps): Promise<Metadata> {
  const { view } = await campOf((await params).id);
  const { opponent } = view.book.bout;
  return { title: opponent ? `${view.athlete.name} v ${opponent}` : `Camp of ${view.athlete.name}` };
}

export default async function Page({ params, searchParams }: PageProps) {
  const { view, now } = await campOf((await params).id);
  const [selected = null] = [(await searchParams).session ?? []].flat();
  return <CampPage key={view.id} initial={view} now={now} selected={selected} />;
}
