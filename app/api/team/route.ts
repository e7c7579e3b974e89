import { withTeam } from "@/lib/http/with-team";
import { teamSchema } from "@/lib/schemas/account";
import { readTeam, renameTeam } from "@/lib/services/team/team";

export const GET = withTeam(readTeam, { may: "account.own" });
export const PUT = withTeam(renameTeam, { may: "team.manage", body: teamSchema });
