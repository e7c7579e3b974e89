import { startCampForm } from "@/lib/book/start-camp";
import { AppError } from "@/lib/errors";
import { campFormSchema } from "@/lib/schemas/camp";
import { START_DEFAULTS, readStartParams } from "@/lib/schemas/start-params";
import type { TeamContext } from "@/lib/services/context";
import { createCamp } from "./create";

/** Name of the athlete until the coach gives a better one. */
const FIRST_ATHLETE = "My first athlete";

/** Keeps the camp that the start page laid out: the inputs come as its address holds them. */
export async function keepStartCamp(
  ctx: TeamContext,
  { body }: { body: { camp: string } },
): Promise<{ id: string }> {
  const params = readStartParams(new URLSearchParams(body.camp), { ...START_DEFAULTS, date: "" });
  const form = campFormSchema.safeParse(startCampForm(params, params.zone ?? "UTC", FIRST_ATHLETE));
  if (!form.success) {
    throw new AppError("invalid", "The camp in this link cannot be kept.", {
      errors: form.error.issues.map((issue) => ({
        pointer: `/camp/${issue.path.join("/")}`,
        message: issue.message,
      })),
    });
  }
  return createCamp(ctx, { body: form.data });
}
