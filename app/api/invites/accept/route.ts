import { withAnyone } from "@/lib/http/with-public";
import { acceptInviteSchema } from "@/lib/schemas/account";
import { acceptInvite } from "@/lib/services/accounts/accept-invite";

export const POST = withAnyone(acceptInvite, { body: acceptInviteSchema });
