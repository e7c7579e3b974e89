import { ITEM_TITLES, dayFromIso } from "@/lib/engine";
import type { KnockOn } from "@/lib/engine/types";
import { dayText, momentText } from "@/lib/format/civil";
import type { Change } from "@/lib/schemas/change";
import type { StandingCamp } from "./preview";

const SCOPE = { this: "", following: " and those after it", all: ", all of them" } as const;

function sportWords(knockOn: KnockOn, scope: keyof typeof SCOPE, verb: string): string {
  const first = knockOn.sport[0];
  if (!first) return `${verb} a sport session`;
  if (first.kind === "moved" && first.from && first.to) {
    return `Moved ${first.title} from ${momentText(first.from)} to ${momentText(first.to)}${SCOPE[scope]}`;
  }
  const at = first.from ?? first.to;
  return `${verb} ${first.title}${at ? `, ${momentText(at)}` : ""}${SCOPE[scope]}`;
}

const daysText = ({ from, to }: { readonly from: string; readonly to: string }): string =>
  from === to ? dayText(dayFromIso(from)) : `${dayText(dayFromIso(from))} to ${dayText(dayFromIso(to))}`;

/** What a change did, in one line, for the list of changes and for mail. */
export function changeWords(change: Change, standing: StandingCamp, knockOn: KnockOn): string {
  const liftTitle = (id: string): string => {
    const lift = standing.plan.lifts.find((candidate) => candidate.id === id);
    return lift ? ITEM_TITLES[lift.item] : "a lift";
  };
  switch (change.kind) {
    case "lift.move": {
      const effect = knockOn.lifts.find((candidate) => candidate.id === change.liftId);
      const where =
        effect?.from && effect.to ? ` from ${momentText(effect.from)} to ${momentText(effect.to)}` : "";
      return effect?.kind === "moved"
        ? `Moved ${ITEM_TITLES[change.item]}${where}`
        : `Pinned ${ITEM_TITLES[change.item]} where it stands`;
    }
    case "lift.release":
      return `Lifted the pin of ${liftTitle(change.liftId)}`;
    case "lift.factor":
      return `Set the coach's factor of ${liftTitle(change.liftId)} to ${change.factor}`;
    // Not the reason: more people read the list of changes than may read check-ins.
    case "response.add":
      return `Accepted a suggestion: sets × ${change.factor}, ${daysText(change)}`;
    case "response.drop": {
      const known = standing.book.responses.find((response) => response.id === change.id);
      return `Took back an accepted suggestion${known ? `: sets × ${known.factor}, ${daysText(known)}` : ""}`;
    }
    case "sport.add":
      return `Added ${change.values.title}`;
    case "sport.edit":
      return sportWords(knockOn, change.scope, "Edited");
    case "sport.drop":
      return sportWords(knockOn, change.scope, "Took out");
    case "bout.change":
      return knockOn.bout
        ? `Moved the bout to ${momentText({ day: knockOn.bout.to.day, start: knockOn.bout.to.start })}`
        : "Changed the bout";
    case "bout.off":
      return "Marked the bout off";
    case "put-back":
      return `Put back change ${change.revision}`;
  }
}
