import type { BoutResult } from "@/lib/schemas/result";

export const RESULT_WORDS: Record<BoutResult["result"], string> = {
  won: "Won",
  lost: "Lost",
  draw: "Draw",
  "no-contest": "No contest",
};
