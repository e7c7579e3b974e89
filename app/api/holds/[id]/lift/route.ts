import { withTeam } from "@/lib/http/with-team";
import { liftHold } from "@/lib/services/holds/holds";

export const POST = withTeam(liftHold, { may: "holds.write" });
