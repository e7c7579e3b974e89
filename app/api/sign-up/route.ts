import { withAnyone } from "@/lib/http/with-public";
import { signUpSchema } from "@/lib/schemas/account";
import { signUp } from "@/lib/services/accounts/sign-up";

export const POST = withAnyone(signUp, { body: signUpSchema, status: 202 });
