import { database } from "@/db/pool";
import { answer } from "@/lib/http/with-team";
import { checkHealth } from "@/lib/services/health/check";

/** 200 where all is well, 503 with which part is down. Says nothing that a stranger should not know. */
export async function GET(): Promise<Response> {
  const { ok, ...parts } = await checkHealth(database());
  return answer({ status: ok ? "up" : "down", ...parts }, ok ? 200 : 503);
}
