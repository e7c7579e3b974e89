import { withAnyone } from "@/lib/http/with-public";
import { resetConfirmSchema } from "@/lib/schemas/account";
import { resetPassword } from "@/lib/services/accounts/reset";

export const POST = withAnyone(resetPassword, { body: resetConfirmSchema });
