import { FROM_WORDS } from "@/lib/engine/prescription/wording";
import type { Best } from "@/lib/engine/prescription/types";
import { dayText } from "./civil";
import { massText, type MassUnit } from "./load";

/** What was lifted for a best. */
export interface Lifted {
  readonly kg: number;
  readonly reps: number;
}

/** "125 kg, estimated by Epley from 110 kg × 4 on Tue 3 Nov", "125 kg, measured on Tue 3 Nov". */
export function bestText(best: Best, lifted: Lifted | null, unit: MassUnit): string {
  const mass = massText(best.kg, unit);
  const on = `on ${dayText(best.day)}`;
  if (best.from === "measured") return `${mass}, measured ${on}`;
  const from = lifted ? ` from ${massText(lifted.kg, unit)} × ${lifted.reps}` : "";
  return `${mass}, estimated by ${FROM_WORDS[best.from]}${from} ${on}`;
}
