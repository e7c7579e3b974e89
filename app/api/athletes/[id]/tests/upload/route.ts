import { withTeam } from "@/lib/http/with-team";
import { trialUploadSchema } from "@/lib/schemas/test-trial";
import { uploadTrials } from "@/lib/services/tests/tests";

export const POST = withTeam(uploadTrials, { may: "tests.write", body: trialUploadSchema, status: 201 });
