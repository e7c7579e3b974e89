import { withTeam } from "@/lib/http/with-team";
import { roleChangeSchema } from "@/lib/schemas/account";
import { changeRole, removeMember } from "@/lib/services/accounts/people";

export const PATCH = withTeam(changeRole, { may: "team.manage", body: roleChangeSchema });
export const DELETE = withTeam(removeMember, { may: "team.manage" });
