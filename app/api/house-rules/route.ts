import { withTeam } from "@/lib/http/with-team";
import { houseRulesSchema } from "@/lib/schemas/house-rules";
import { readRules, saveRules } from "@/lib/services/rules/rules";

export const GET = withTeam(readRules, { may: "rules.read" });
export const PUT = withTeam(saveRules, { may: "rules.write", body: houseRulesSchema });
