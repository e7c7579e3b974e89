import { withTeam } from "@/lib/http/with-team";
import { takeBackUpload } from "@/lib/services/tests/tests";

/** Takes a file of trials back whole. */
export const DELETE = withTeam(takeBackUpload, { may: "tests.write" });
