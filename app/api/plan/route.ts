import { env } from "@/lib/env";
import { withPublic } from "@/lib/http/with-public";
import { planRequestSchema } from "@/lib/schemas/plan";
import { layOut } from "@/lib/services/plan/lay-out";

/** Stateless: no account, nothing kept. */
export const POST = withPublic(({ body, now }) => layOut(body, now), {
  body: planRequestSchema,
  limit: { name: "plan", calls: () => env().PLAN_RATE_PER_MINUTE, seconds: 60 },
});
