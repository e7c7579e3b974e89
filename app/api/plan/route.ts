import { withPublic } from "@/lib/http/with-public";
import { planRequestSchema } from "@/lib/schemas/plan";
import { layOut } from "@/lib/services/plan/lay-out";

/** Stateless: no account, nothing kept. 60 calls a minute an address. */
export const POST = withPublic(({ body, now }) => layOut(body, now), {
  body: planRequestSchema,
  limit: { name: "plan", calls: 60, seconds: 60 },
});
