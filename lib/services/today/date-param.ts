import { dayFromIso } from "@/lib/engine";
import type { Day } from "@/lib/engine/types";
import { AppError } from "@/lib/errors";
import { civilDateParam } from "@/lib/schemas/today";

/** The day that a path names. Throws `invalid` for what is no day. */
export function dayParam(text: string | undefined): Day {
  const parsed = civilDateParam.safeParse(text);
  if (parsed.success) return dayFromIso(parsed.data);
  throw new AppError("invalid", "Give a date as YYYY-MM-DD.", {
    errors: [{ pointer: "", message: "Give a date as YYYY-MM-DD." }],
  });
}
