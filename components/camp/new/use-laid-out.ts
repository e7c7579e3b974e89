"use client";

import { useMemo, useState } from "react";
import { planBook, type PlannedCamp } from "@/lib/book";
import { RecurrenceError } from "@/lib/calendar/recurrence";
import { PlanInputError } from "@/lib/engine";
import type { Instant } from "@/lib/engine/types";
import { campFormSchema } from "@/lib/schemas/camp";
import type { CampBook } from "@/lib/schemas/camp-book";
import { bookOfForm, formOfDraft, type Draft } from "./draft";

type Result = { readonly camp: PlannedCamp } | { readonly problem: string };

/** What the name is does not matter for laying a camp out. */
const named = (draft: Draft): Draft => ({ ...draft, athleteName: draft.athleteName.trim() || "New athlete" });

function layOut(draft: Draft, rules: CampBook["rules"], now: Instant): Result {
  try {
    const parsed = campFormSchema.safeParse(formOfDraft(named(draft)));
    if (!parsed.success)
      return { problem: parsed.error.issues[0]?.message ?? "Some fields need another look." };
    return { camp: planBook(bookOfForm(parsed.data, rules), now) };
  } catch (error) {
    if (error instanceof PlanInputError) return { problem: error.problems[0]?.message ?? error.message };
    if (error instanceof RecurrenceError || error instanceof RangeError) return { problem: error.message };
    throw error;
  }
}

/** The camp for the form as it stands; while that cannot be laid out, the last one that could, and why. */
export function useLaidOut(draft: Draft, rules: CampBook["rules"], now: Instant) {
  const result = useMemo(() => layOut(draft, rules, now), [draft, rules, now]);
  const fresh = "camp" in result ? result.camp : null;
  const [last, setLast] = useState(fresh);
  if (fresh && fresh !== last) setLast(fresh);
  return { camp: fresh ?? last, problem: "problem" in result ? result.problem : null };
}
