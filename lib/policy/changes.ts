import type { ChangeKind } from "@/lib/schemas/change";
import type { Action } from "./table";

/** What a change asks of the one who saves it. */
export const CHANGE_ACTION: Record<ChangeKind, Action> = {
  "lift.move": "lifts.write",
  "lift.release": "lifts.write",
  "lift.factor": "lifts.write",
  "response.add": "lifts.write",
  "response.drop": "lifts.write",
  "sport.add": "sport.write",
  "sport.edit": "sport.write",
  "sport.drop": "sport.write",
  "bout.change": "camps.bout",
  "bout.off": "camps.bout",
  "put-back": "camps.put-back",
};
