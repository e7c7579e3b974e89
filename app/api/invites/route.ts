import { withTeam } from "@/lib/http/with-team";
import { inviteSchema } from "@/lib/schemas/account";
import { invite } from "@/lib/services/accounts/invite";

export const POST = withTeam(invite, { may: "team.manage", body: inviteSchema, status: 201 });
