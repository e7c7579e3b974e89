import { withTeam } from "@/lib/http/with-team";
import { athleteFormSchema } from "@/lib/schemas/athlete";
import { addAthlete, listRoster } from "@/lib/services/athletes/athletes";

export const GET = withTeam(listRoster, { may: "athletes.read" });
export const POST = withTeam(addAthlete, { may: "athletes.write", body: athleteFormSchema, status: 201 });
