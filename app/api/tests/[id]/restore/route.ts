import { withTeam } from "@/lib/http/with-team";
import { restoreTrial } from "@/lib/services/tests/tests";

export const POST = withTeam(restoreTrial, { may: "tests.write" });
