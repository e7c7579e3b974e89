import { withTeam } from "@/lib/http/with-team";
import { athleteFormSchema } from "@/lib/schemas/athlete";
import { editAthlete, readAthlete } from "@/lib/services/athletes/athletes";

export const GET = withTeam(readAthlete, { may: "athletes.read" });
export const PUT = withTeam(editAthlete, { may: "athletes.write", body: athleteFormSchema });
