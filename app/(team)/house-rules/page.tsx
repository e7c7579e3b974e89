import type { Metadata } from "next";
import { RulesForm } from "@/components/rules/rules-form";
import { PageHead } from "@/components/shell/page-head";
import { pageContext } from "@/lib/http/page";
import { readRules } from "@/lib/services/rules/rules";

export const metadata: Metadata = { title: "House rules" };

export default async function HouseRulesPage() {
  const ctx = await pageContext("rules.write");
  const rules = await readRules(ctx);
  return (
    <>
      <PageHead
        title="House rules"
        lead="The thresholds that the planner obeys, each with its reason and source. “Common practice” means that coaches do it, not that it was tested."
      />
      <RulesForm initial={rules} />
    </>
  );
}
