import { withTeam } from "@/lib/http/with-team";
import { accountSchema } from "@/lib/schemas/account";
import { readAccount, updateAccount } from "@/lib/services/accounts/account";

export const GET = withTeam(readAccount, { may: "account.own" });
export const PUT = withTeam(updateAccount, { may: "account.own", body: accountSchema });
