import { civilNow, dateOf } from "@/lib/calendar/zones";
import type { Day, Instant } from "@/lib/engine/types";
import type { CampBook } from "@/lib/schemas/camp-book";

/** Today on the wall of the gym. */
export const todayOf = ({ homeZone }: Pick<CampBook, "homeZone">, now: Instant): Day =>
  civilNow(homeZone, dateOf(now)).day;
