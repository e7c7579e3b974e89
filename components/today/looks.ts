import { ITEM_LOOKS, SPORT_LOOKS, WEIGH_IN_LOOK, type WorkLook } from "@/components/session/kinds";
import type { SportKind } from "@/lib/engine/types";
import type { DaySession } from "@/lib/schemas/today";

/** The look of a session's kind; null for the bout, which is written out. */
export function lookOf(session: Pick<DaySession, "source" | "kind" | "item">): WorkLook | null {
  if (session.source === "bout") return null;
  if (session.source === "weigh-in") return WEIGH_IN_LOOK;
  if (session.item !== null) return ITEM_LOOKS[session.item];
  return SPORT_LOOKS[session.kind as SportKind] ?? SPORT_LOOKS.other;
}

/** Kinds in which heads are hit. */
const CONTACT: ReadonlySet<string> = new Set(["hard-sparring", "technical-sparring"]);

export const isSparring = ({ source, kind }: Pick<DaySession, "source" | "kind">): boolean =>
  source === "sport" && CONTACT.has(kind);

/** Travel and rest are on the plan, but nothing to log. */
export const isLogged = ({ source, kind }: Pick<DaySession, "source" | "kind">): boolean =>
  source === "lift" || (source === "sport" && kind !== "travel" && kind !== "rest");
