import { withTeam } from "@/lib/http/with-team";
import { passwordChangeSchema } from "@/lib/schemas/account";
import { changePassword } from "@/lib/services/accounts/account";

export const POST = withTeam(changePassword, { may: "account.own", body: passwordChangeSchema });
