import { withTeam } from "@/lib/http/with-team";
import { trialFormSchema } from "@/lib/schemas/test-trial";
import { addTrial, listTests } from "@/lib/services/tests/tests";

export const GET = withTeam(listTests, { may: "tests.read" });
export const POST = withTeam(addTrial, { may: "tests.write", body: trialFormSchema, status: 201 });
