import { withAnyone } from "@/lib/http/with-public";
import { resetRequestSchema } from "@/lib/schemas/account";
import { requestReset } from "@/lib/services/accounts/reset";

export const POST = withAnyone(requestReset, { body: resetRequestSchema });
