import { withTeam } from "@/lib/http/with-team";
import { checkInSchema } from "@/lib/schemas/today";
import { saveCheckIn } from "@/lib/services/today/check-ins";

export const PUT = withTeam(saveCheckIn, { may: "checkins.write", body: checkInSchema });
