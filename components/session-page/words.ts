import { ITEM_LOOKS, SPORT_LOOKS, WEIGH_IN_LOOK, liftLook, type WorkLook } from "@/components/session/kinds";
import { dayFromIso } from "@/lib/engine/geometry";
import type { Item, SportKind } from "@/lib/engine/types";
import { dayText } from "@/lib/format/civil";
import { loadText, massText, repsText, spanText, type MassUnit } from "@/lib/format/load";
import type { LineView, SessionPageView } from "@/lib/schemas/prescription";
import type { LastTime, LoggedSet } from "@/lib/schemas/today";

/** How a session looks; the bout looks like what is hardest. */
export function lookOf({ session, lift }: Pick<SessionPageView, "session" | "lift">): WorkLook {
  switch (session.source) {
    case "lift":
      return lift ? liftLook(lift.lift.item, lift.lift.phase) : ITEM_LOOKS[session.kind as Item];
    case "sport":
      return SPORT_LOOKS[session.kind as SportKind];
    case "weigh-in":
      return WEIGH_IN_LOOK;
    case "bout":
      return { ...SPORT_LOOKS["hard-sparring"], label: "Bout" };
  }
}

/** "9 days out", "1 day out", "bout day". */
export const daysOutText = (days: number): string =>
  days === 0 ? "bout day" : `${days} ${days === 1 ? "day" : "days"} out`;

const FIELD_WORDS = {
  exercise: "the exercise",
  sets: "sets",
  reps: "repetitions",
  kg: "load",
  note: "a note",
};

/** "Coach: 4 sets, was 5; 100 kg, was 105 kg"; null where nothing but a note was written. */
export function editText({ edited, planned, ...line }: LineView, unit: MassUnit): string | null {
  const fields = edited.filter((field) => field !== "note");
  if (fields.length === 0) return null;
  if (!planned) return `Coach wrote ${fields.map((field) => FIELD_WORDS[field]).join(", ")}`;
  const parts = fields.map((field): string => {
    switch (field) {
      case "exercise":
        return `${line.name}, was ${planned.name}`;
      case "sets":
        return `${line.sets} ${line.sets === 1 ? "set" : "sets"}, was ${planned.sets}`;
      case "reps":
        return `${repsText(line)}, was ${repsText(planned)}`;
      default:
        return `${loadText(line.load, unit)}, was ${loadText(planned.load, unit) || "without load"}`;
    }
  });
  return `Coach: ${parts.join("; ")}`;
}

/** "Last time 102.5 kg × 5 on Tue 24 Nov". */
export function lastTimeText({ date, kg, reps }: LastTime, hold: boolean, unit: MassUnit): string {
  const count = hold ? `${reps} s` : `${reps}`;
  const done = kg === null ? `${count}${hold ? "" : " repetitions"}` : `${massText(kg, unit)} × ${count}`;
  return `Last time ${done} on ${dayText(dayFromIso(date))}`;
}

/** "105 kg × 5, 2 in reserve". */
export function setText({ kg, reps, reserve }: LoggedSet, hold: boolean, unit: MassUnit): string {
  const count = hold ? `${reps} s` : `${reps}`;
  const done = kg === null ? count : `${massText(kg, unit)} × ${count}`;
  return reserve === null ? done : `${done}, ${reserve} in reserve`;
}

/** "84 to 86 % of"; empty for a load that is no percent of a best. */
export const percentOfText = ({ load }: Pick<LineView, "load">): string =>
  load.of === "best" ? `${spanText(load.percent)} % of` : "";
