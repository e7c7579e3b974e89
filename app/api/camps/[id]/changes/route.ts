import { withCamp } from "@/lib/http/with-team";
import { saveChangeSchema } from "@/lib/schemas/change";
import { listChanges } from "@/lib/services/camps/read";
import { saveChange } from "@/lib/services/camps/save-change";

export const GET = withCamp(listChanges, { may: "camps.history" });
// What the change asks of its author depends on its kind: the service looks it up in the policy table.
export const POST = withCamp(saveChange, { body: saveChangeSchema });
