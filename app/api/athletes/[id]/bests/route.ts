import { withTeam } from "@/lib/http/with-team";
import { bestFormSchema } from "@/lib/schemas/prescription";
import { addBest, listAthleteBests } from "@/lib/services/prescription/bests";

export const GET = withTeam(listAthleteBests, { may: "tests.read" });
export const POST = withTeam(addBest, { may: "bests.write", body: bestFormSchema, status: 201 });
