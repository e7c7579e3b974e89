import { withTeam } from "@/lib/http/with-team";
import { removeTrial } from "@/lib/services/tests/tests";

export const DELETE = withTeam(removeTrial, { may: "tests.write" });
