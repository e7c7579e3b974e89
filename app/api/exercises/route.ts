import { withTeam } from "@/lib/http/with-team";
import { exerciseFormSchema } from "@/lib/schemas/exercise";
import { listTeamExercises } from "@/lib/services/exercises/read";
import { addExercise } from "@/lib/services/exercises/save";

export const GET = withTeam(listTeamExercises, { may: "exercises.read" });
export const POST = withTeam(addExercise, { may: "exercises.write", body: exerciseFormSchema, status: 201 });
