import { withTeam } from "@/lib/http/with-team";
import { revokeInvite } from "@/lib/services/accounts/invite";

export const DELETE = withTeam(revokeInvite, { may: "team.manage" });
