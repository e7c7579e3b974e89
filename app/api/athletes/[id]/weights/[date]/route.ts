import { withTeam } from "@/lib/http/with-team";
import { weightSchema } from "@/lib/schemas/today";
import { dropWeight, saveWeight } from "@/lib/services/today/weights";

export const PUT = withTeam(saveWeight, { may: "weight.write", body: weightSchema });
export const DELETE = withTeam(dropWeight, { may: "weight.write" });
