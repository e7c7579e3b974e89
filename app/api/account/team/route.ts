import { withTeam } from "@/lib/http/with-team";
import { teamChoiceSchema } from "@/lib/schemas/account";
import { switchTeam } from "@/lib/services/accounts/account";

export const POST = withTeam(switchTeam, { may: "account.own", body: teamChoiceSchema });
