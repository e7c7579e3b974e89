import type { Metadata } from "next";
import { NewAthlete } from "@/components/athlete/new-athlete";
import { PageHead } from "@/components/shell/page-head";
import { pageContext } from "@/lib/http/page";

export const metadata: Metadata = { title: "Add an athlete" };

export default async function NewAthletePage() {
  await pageContext("athletes.write");
  return (
    <>
      <PageHead title="Add an athlete" lead="What the planner needs to lay lifting around the sport." />
      <NewAthlete />
    </>
  );
}
