import type { KnockOn, Plan, PlanInput } from "@/lib/engine/types";
import type { FieldError } from "@/lib/errors";
import type { CampBook } from "@/lib/schemas/camp-book";
import type { BookEdit } from "./edit";

/** What a change would make of a camp; nothing is saved. */
export interface Preview {
  readonly edit: BookEdit;
  readonly book: CampBook;
  readonly input: PlanInput;
  readonly plan: Plan;
  readonly knockOn: KnockOn;
}

export type PreviewResult = Preview | { readonly problems: readonly FieldError[] };

export const isPreview = (result: PreviewResult): result is Preview => "plan" in result;
